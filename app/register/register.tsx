import type { RegisterRow, RegisterView } from "../../lib/review/views";
import { MarginCell } from "./margin-cell";
import { RegisterKey } from "./register-key";
import { RevisionTriangle } from "./revision-triangle";

const COLUMNS = ["1", "2", "3", "4", "5", "6"];
const ROWS = ["A", "B", "C", "D"];

/** The drawing register: what waits for the one who looks, then every design of the workspace. */
export function Register(props: { readonly view: RegisterView }) {
  const { view } = props;
  const firstName = view.me.name.split(" ")[0] ?? view.me.name;
  return (
    <main className="register">
      <HatchOver />
      <div className="rframe">
        <Zones />
        <div className="rin">
          <section className="waits">
            <h2>
              {view.waiting.length > 0 ? `Waits for you, ${firstName}` : "Nothing waits for you"}
            </h2>
            <div className="slips">
              {view.waiting.map((card) => (
                <article className="slip" key={card.href + card.heading}>
                  <h3>{card.heading}</h3>
                  <p>{card.text}</p>
                  <footer>
                    <span className="cap">{card.why}</span>
                    <a className="btn" href={card.href}>
                      {card.action}
                    </a>
                  </footer>
                </article>
              ))}
            </div>
          </section>
          <section>
            <h2>
              Drawing register <span className="dim">{countWords(view.rows.length)}</span>
            </h2>
            <div className="rwrap">
              <table className="reg">
                <thead>
                  <tr>
                    <th>Number</th>
                    <th>Title</th>
                    <th>Sheet</th>
                    <th>Revisions</th>
                    <th>State</th>
                    <th>Waits for</th>
                    <th>
                      <div className="mcell">
                        <svg
                          className="mb"
                          width="130"
                          height="14"
                          viewBox="0 0 130 14"
                          aria-hidden="true"
                        >
                          <text x="28.4" y="11">
                            0
                          </text>
                          <text x="124" y="11" style={{ textAnchor: "end" }}>
                            +100 %
                          </text>
                        </svg>
                        <span>Least margin</span>
                      </div>
                    </th>
                  </tr>
                </thead>
                <tbody>
                  {view.rows.map((row) => (
                    <Row key={row.number} row={row} />
                  ))}
                </tbody>
              </table>
            </div>
          </section>
          <div className="rfoot">
            <RegisterKey />
            <dl className="rtitle">
              <div>
                <dt>Legal owner</dt>
                <dd>{view.workspace}</dd>
              </div>
              <div className="w2">
                <dt>Title</dt>
                <dd className="t">Drawing register</dd>
              </div>
              <div>
                <dt>Document type</dt>
                <dd>Register</dd>
              </div>
              <div>
                <dt>As of</dt>
                <dd className="num">{view.asOf}</dd>
              </div>
              <div>
                <dt>Sheet</dt>
                <dd className="num">1 / 1</dd>
              </div>
            </dl>
          </div>
        </div>
      </div>
    </main>
  );
}

function Row(props: { readonly row: RegisterRow }) {
  const { row } = props;
  return (
    <tr className={row.waitsForMe ? "hot" : ""}>
      <td className="num">
        <a href={row.href}>{row.number}</a>
      </td>
      <td>
        <b>{row.title}</b>
      </td>
      <td className="num">{row.sheetSize}</td>
      <td className="revs">
        {row.revisions.length === 0 ? (
          <span className="dim">none yet</span>
        ) : (
          row.revisions.map((revision) => <RevisionTriangle key={revision.letter} {...revision} />)
        )}
      </td>
      <td>{row.state}</td>
      <td>
        {row.waitsFor === null ? (
          <span className="dim">nobody</span>
        ) : (
          <>
            <b>{row.waitsFor.name}</b>
            <span className="sub2">{row.waitsFor.to}</span>
          </>
        )}
      </td>
      <td>
        <MarginCell least={row.leastMargin} />
      </td>
    </tr>
  );
}

function Zones() {
  return (
    <>
      {["top", "bottom"].map((side) => (
        <div key={side} className={`rz ${side}`} aria-hidden="true">
          {COLUMNS.map((zone) => (
            <span key={zone}>{zone}</span>
          ))}
        </div>
      ))}
      {["left", "right"].map((side) => (
        <div key={side} className={`rz ${side}`} aria-hidden="true">
          {ROWS.map((zone) => (
            <span key={zone}>{zone}</span>
          ))}
        </div>
      ))}
    </>
  );
}

/** The pattern of what is over a limit; bars of the table and of the key refer to it. */
function HatchOver() {
  return (
    <svg className="sr" aria-hidden="true">
      <defs>
        <pattern
          id="hatch-over"
          width="4"
          height="4"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <path className="pat-over" d="M0 0V4" />
        </pattern>
      </defs>
    </svg>
  );
}

function countWords(count: number): string {
  return count === 1 ? "1 design" : `${count} designs`;
}
