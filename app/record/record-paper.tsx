import type { OutlineBlock, OutlineCell, RecordOutline } from "../../lib/record/record-outline";

/** The record as printed sheets: what the PDF holds, drawn for the screen. */
export function RecordPaper(props: { readonly outline: RecordOutline }) {
  const { outline } = props;
  const sheets = [outline.sections.slice(0, 4), outline.sections.slice(4)];
  return (
    <main className="papers">
      {sheets.map((sections, index) => (
        <article className="a4" key={sections[0]?.number ?? index}>
          <Zones />
          <div className="pin">
            {index === 0 && <Head outline={outline} />}
            {sections.map((section) => (
              <section key={section.number}>
                <h2>
                  <span>{section.number}</span>
                  {section.title}
                </h2>
                {section.blocks.map((block) => (
                  <Block key={JSON.stringify(block).slice(0, 120)} block={block} />
                ))}
              </section>
            ))}
            <dl className="ptitle">
              {[
                ...outline.titleBlock,
                { field: "Sheet", value: `${index + 1} / ${sheets.length}` },
              ].map((entry) => (
                <div key={entry.field}>
                  <dt>{entry.field}</dt>
                  <dd>{entry.value}</dd>
                </div>
              ))}
            </dl>
          </div>
        </article>
      ))}
    </main>
  );
}

function Head(props: { readonly outline: RecordOutline }) {
  const { outline } = props;
  return (
    <div className="phead">
      <div>
        <p className="cap">Design review record</p>
        <h1>{outline.heading}</h1>
        <p>{outline.introduction}</p>
      </div>
      <div className="outcome">
        <b>{outline.outcome.words}</b>
        <span>{outline.outcome.detail}</span>
      </div>
    </div>
  );
}

function Block(props: { readonly block: OutlineBlock }) {
  const { block } = props;
  switch (block.kind) {
    case "text":
      return <p>{block.text}</p>;
    case "small":
      return <p className="small">{block.text}</p>;
    case "list":
      return (
        <ul className="caut">
          {block.items.map((item) => (
            <li key={item}>{item}</li>
          ))}
        </ul>
      );
    case "signatures":
      return (
        <div className="sigs">
          {block.signatures.map((signature) => (
            <div className="sig" key={signature.meaning + signature.at}>
              <p className="cap">{signature.meaning}</p>
              <p className="n">{signature.name}</p>
              <p>{signature.function}</p>
              <p className="num">{signature.at}</p>
              <p className="small">{signature.method}</p>
              <p className="num small">{signature.digest}</p>
            </div>
          ))}
          {block.signatures.length === 0 && <p className="sig">Nobody has signed this revision.</p>}
        </div>
      );
    case "table":
      return <Table block={block} />;
  }
}

function Table(props: { readonly block: Extract<OutlineBlock, { kind: "table" }> }) {
  const { block } = props;
  const whole = block.widths.reduce((sum, width) => sum + width, 0);
  return (
    <table className="pt">
      <colgroup>
        {block.widths.map((width, column) => (
          <col
            key={block.head[column] ?? `${column} of ${width}`}
            style={{ width: `${(width / whole) * 100}%` }}
          />
        ))}
      </colgroup>
      {block.head.length > 0 && (
        <thead>
          <tr>
            {block.head.map((words) => (
              <th key={words}>{words}</th>
            ))}
          </tr>
        </thead>
      )}
      <tbody>
        {block.rows.map((row) => (
          <tr key={row.map((cell) => cell.text).join("|")}>
            {row.map((cell, column) => (
              <Cell key={`${block.head[column] ?? column}`} cell={cell} />
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const LOOKS = {
  number: "num",
  struck: "num struck",
  worse: "num worse",
  strong: "strong",
} as const;

function Cell(props: { readonly cell: OutlineCell }) {
  const { cell } = props;
  return (
    <td className={cell.look === undefined ? "" : LOOKS[cell.look]}>
      {cell.mark !== undefined && <Mark mark={cell.mark} />}
      {cell.text}
      {cell.sub !== undefined && cell.sub !== "" && <span className="sub">{cell.sub}</span>}
    </td>
  );
}

/** Met: a tick. Not met: a crossed box. Not known: a hatched box. */
function Mark(props: { readonly mark: NonNullable<OutlineCell["mark"]> }) {
  return (
    <svg
      className="ck"
      viewBox="0 0 12 12"
      role="img"
      aria-label={props.mark === "met" ? "met" : props.mark === "notMet" ? "not met" : "not known"}
    >
      {props.mark === "met" && (
        <path d="M1.5 6.5l3 3.5L10.5 2" fill="none" stroke="currentColor" strokeWidth="2" />
      )}
      {props.mark !== "met" && (
        <path
          d={
            props.mark === "notMet"
              ? "M1.5 1.5H10.5V10.5H1.5ZM1.5 1.5L10.5 10.5M10.5 1.5L1.5 10.5"
              : "M1.5 1.5H10.5V10.5H1.5ZM1.5 6L6 1.5M1.5 10.5L10.5 1.5M6 10.5L10.5 6"
          }
          fill="none"
          stroke="var(--red)"
          strokeWidth="1.3"
        />
      )}
    </svg>
  );
}

function Zones() {
  return (
    <>
      <div className="pz t" aria-hidden="true">
        {["1", "2", "3", "4"].map((zone) => (
          <span key={zone}>{zone}</span>
        ))}
      </div>
      <div className="pz l" aria-hidden="true">
        {["A", "B", "C", "D", "E", "F"].map((zone) => (
          <span key={zone}>{zone}</span>
        ))}
      </div>
    </>
  );
}
