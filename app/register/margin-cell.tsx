import type { RegisterRow } from "../../lib/review/views";
import { marginWords } from "../wording/numbers";

/** Units of the bar: 0 stands at 28.4, +100 % at 126. */
const ZERO = 28.4;
const PER_UNIT = 97.6;
const TICKS = [52.8, 77.2, 101.6, 126];

/** The least margin as a bar from zero: hatched when over a limit, open below +10 %, else solid. */
export function MarginCell(props: { readonly least: RegisterRow["leastMargin"] }) {
  if (props.least === null) {
    return (
      <div className="mcell">
        <span className="dim">not solved</span>
      </div>
    );
  }
  const { margin, part, waived } = props.least;
  const end = Math.min(Math.max(ZERO + margin * PER_UNIT, 4), 126);
  const over = margin < 0;
  const fill = over ? "url(#hatch-over)" : margin < 0.1 ? "none" : "var(--ink)";
  return (
    <div className="mcell">
      <svg className="mb" viewBox="0 0 130 18" width="130" height="18" aria-hidden="true">
        <path d="M4 14.5H126" stroke="var(--hair)" />
        <path d={`M${ZERO} 1V17`} stroke="var(--ink)" />
        {TICKS.map((x) => (
          <path key={x} d={`M${x} 12V17`} stroke="var(--rule)" />
        ))}
        <rect
          x={Math.min(ZERO, end)}
          y="4"
          width={Math.max(Math.abs(end - ZERO), 0.8)}
          height="8"
          fill={fill}
          stroke={over ? "var(--red)" : "var(--ink)"}
        />
      </svg>
      <span className={over && !waived ? "num worse" : "num"}>{marginWords(margin)}</span>
      <span className="dim">{waived ? `${part}, waived` : part}</span>
    </div>
  );
}
