import type { Box } from "../../lib/kinds/part-symbol";
import { CellText } from "./cell-text";
import { rectOf } from "./svg-path";
import type { RevisionRow } from "./title-facts";

const ROW = 15;
const COLUMNS = [0, 26, 176, 244];

/** Upper right: the revisions, newest first. */
export function RevisionBlock({
  box,
  rows,
}: {
  readonly box: Box;
  readonly rows: readonly RevisionRow[];
}) {
  const [left, top, right, bottom] = box;
  const [rev = 0, change = 0, date = 0, by = 0] = COLUMNS.map((column) => left + column);
  return (
    <g>
      <rect className="tbo" {...rectOf(box)} />
      {[rev, change, date, by].map((x, index) => (
        <CellText key={x} look="tc" x={x + 5} y={top + 11} room={60}>
          {["REV", "CHANGE", "DATE", "BY"][index] ?? ""}
        </CellText>
      ))}
      {rows.map((row, index) => {
        const y = top + ROW * (index + 1);
        return (
          <g key={row.letter}>
            <path className="tbl" d={`M${left} ${y}H${right}`} />
            <CellText look="tm" x={rev + 8} y={y + 11} room={20}>
              {row.letter}
            </CellText>
            <CellText look="tv" x={change + 6} y={y + 11.3} room={142}>
              {row.change}
            </CellText>
            <CellText look="tm" x={date + 5} y={y + 11} room={66}>
              {row.date}
            </CellText>
            <CellText look="tm" x={by + 5} y={y + 11} room={24}>
              {row.by}
            </CellText>
          </g>
        );
      })}
      <path className="tbl" d={[change, date, by].map((x) => `M${x} ${top}V${bottom}`).join("")} />
    </g>
  );
}
