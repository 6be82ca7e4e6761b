import { referenceSymbol } from "../../lib/kinds/reference-symbol";
import type { SheetDrawing } from "../../lib/sheet/sheet-drawing";
import { Letters } from "./letters";
import { through } from "./svg-path";
import { SymbolStrokes } from "./symbol-strokes";
import { unspoken } from "./unspoken";

export function GroundsAndFlags({ drawing }: { readonly drawing: SheetDrawing }) {
  return (
    <g {...unspoken}>
      {drawing.grounds.map(({ at: [x, y], removed }) => (
        <g
          key={`${x} ${y}`}
          className={removed ? "sy removed" : "sy"}
          transform={`translate(${x} ${y})`}
        >
          <SymbolStrokes strokes={referenceSymbol} />
        </g>
      ))}
      {drawing.flags.map(({ outline, letters }) => (
        <g key={through(outline)}>
          <path className="w" d={`${through(outline)}Z`} />
          <Letters letters={letters} />
        </g>
      ))}
    </g>
  );
}
