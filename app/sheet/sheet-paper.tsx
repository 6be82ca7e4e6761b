import type { SheetDrawing } from "../../lib/sheet/sheet-drawing";
import { Letters } from "./letters";
import { rectOf, through } from "./svg-path";
import { unspoken } from "./unspoken";

/** What the sheet has before anything is drawn: edge, frame, zones, centring marks, and lettering of no part. */
export function SheetPaper({ drawing }: { readonly drawing: SheetDrawing }) {
  const { width, height, frame, zones, texts } = drawing;
  return (
    <g {...unspoken}>
      <rect className="trim" x={0.4} y={0.4} width={width - 0.8} height={height - 0.8} />
      <rect className="frame" {...rectOf(frame)} />
      {zones.names.map(({ at: [x, y], text }) => (
        <text key={`${x} ${y}`} className="zt" x={x} y={y}>
          {text}
        </text>
      ))}
      <path className="zl" d={zones.lines.map(through).join("")} />
      <path className="zl centring" d={zones.centring.map(through).join("")} />
      <Letters letters={texts} />
    </g>
  );
}
