import { grown } from "../../lib/sheet/box";
import type { DrawnPart } from "../../lib/sheet/sheet-drawing";
import { Letters } from "./letters";
import { rectOf } from "./svg-path";
import { SymbolStrokes } from "./symbol-strokes";

/** A part: its symbol, its lettering, the hatch of what was checked, the cross of what was removed. */
export function PartShape({ part }: { readonly part: DrawnPart }) {
  const { strokes, origins, turn, mirror, box, letters, removed, checked } = part;
  const turned = `rotate(${turn * 90})${mirror ? " scale(-1 1)" : ""}`;
  return (
    <g className={removed ? "removed" : undefined}>
      {checked && <CheckedHatch part={part} />}
      {origins.map(([x, y]) => (
        <g key={`${x} ${y}`} className="sy" transform={`translate(${x} ${y}) ${turned}`}>
          <SymbolStrokes strokes={strokes} />
        </g>
      ))}
      {removed && <Crossed box={box} />}
      <Letters letters={letters} />
    </g>
  );
}

function CheckedHatch({ part }: { readonly part: DrawnPart }) {
  const [left, top, right, bottom] = grown(part.box, 4);
  const lies = right - left > bottom - top;
  const box = rectOf(
    lies ? [left, top - 2, right, bottom + 2] : [left - 1, top, right + 1, bottom],
  );
  return (
    <>
      <rect className="pat-check-f" rx={2} {...box} />
      <rect className="chk" rx={2} {...box} />
      <path className="tick" d={`M${right + 2} ${top}l2.6 3l5 -7`} />
    </>
  );
}

function Crossed({ box: [left, top, right, bottom] }: { readonly box: DrawnPart["box"] }) {
  const [x, y] = [(left + right) / 2, (top + bottom) / 2];
  return <path className="strike" d={`M${x - 8} ${y - 10}l16 20m0 -20l-16 20`} />;
}
