import { textWidth } from "../../lib/sheet/lettering";
import type { Verdict } from "../../lib/values/verdict";
import { CellText } from "./cell-text";
import type { CriterionLine } from "./title-facts";

const ROW = 14;

interface CriteriaBlockProps {
  readonly criteria: readonly CriterionLine[];
  readonly left: number;
  readonly top: number;
}

/** The exit criteria as computed: met has a tick, not met a crossed box, unfinished a hatched box. */
export function CriteriaBlock({ criteria, left, top }: CriteriaBlockProps) {
  return (
    <g>
      <CellText look="tc" x={left + 7} y={top + 12} room={220}>
        EXIT CRITERIA, COMPUTED
      </CellText>
      {criteria.map(({ words, verdict, count, waived }, index) => {
        const y = top + 27.5 + ROW * index;
        const shown = waived === undefined ? count : `${count}, ${waived}`;
        return (
          <g key={words}>
            <VerdictMark verdict={verdict} x={left + 7.4} y={y - 8.6} />
            <CellText look="tv" x={left + 22} y={y} room={203 - textWidth(shown, "number")}>
              {words}
            </CellText>
            <CellText
              look="tm"
              x={left + 231}
              y={y}
              room={70}
              anchor="end"
              red={verdict !== "pass"}
            >
              {shown}
            </CellText>
          </g>
        );
      })}
    </g>
  );
}

function VerdictMark({ verdict, x, y }: { verdict: Verdict; x: number; y: number }) {
  if (verdict === "pass") {
    return (
      <path className="yes" d={`M${x + 0.6} ${y + 4.6}l3 3.6l5.4 -7.6`}>
        <title>met</title>
      </path>
    );
  }
  const open = verdict === "unknown";
  return (
    <g>
      <title>{open ? "unfinished" : "not met"}</title>
      <rect className={open ? "no box open" : "no box"} x={x} y={y} width={9.4} height={9.4} />
      {!open && <path className="no" d={`M${x + 2.2} ${y + 2.2}l5 5m0 -5l-5 5`} />}
    </g>
  );
}
