import { RevisionTriangle } from "./revision-triangle";

const BARS = [
  { words: "over a limit", fill: "url(#hatch-over)", stroke: "var(--red)" },
  { words: "below +10 %", fill: "none", stroke: "var(--ink)" },
  { words: "+10 % and more", fill: "var(--ink)", stroke: "var(--ink)" },
];

/** What the register's triangles and bars mean. */
export function RegisterKey() {
  return (
    <ul className="rkey">
      <li>
        <RevisionTriangle letter="A" state="released" />
        released
      </li>
      <li>
        <RevisionTriangle letter="B" state="underReview" />
        under review
      </li>
      <li>
        <RevisionTriangle letter="C" state="returned" />
        returned
      </li>
      {BARS.map((bar) => (
        <li key={bar.words}>
          <svg width="30" height="12" aria-hidden="true">
            <rect x="1" y="2" width="26" height="8" fill={bar.fill} stroke={bar.stroke} />
          </svg>
          {bar.words}
        </li>
      ))}
    </ul>
  );
}
