import type { DrawnNet, DrawnWire, SheetDrawing } from "../../lib/sheet/sheet-drawing";
import { TagShape } from "./pencil-marks";
import { through } from "./svg-path";
import { unspoken } from "./unspoken";

/** The wires of a net, with a broad clear line over them to be picked by, and its number. */
export function NetShape({
  net,
  wires,
}: {
  readonly net: DrawnNet;
  readonly wires: readonly DrawnWire[];
}) {
  const path = wires.map(({ points }) => through(points)).join("");
  return (
    <>
      <path className="hitwire" d={path} />
      <path className="w" d={path} />
      {net.tag !== null && <TagShape tag={net.tag} meets={net.tag.leader.length > 1} />}
    </>
  );
}

/** Wires of the reference and of what was removed, dots, grounds and flags: nothing to pick. */
export function LooseLines({ drawing }: { readonly drawing: SheetDrawing }) {
  const named = new Set(drawing.nets.map(({ net }) => net));
  const loose = drawing.wires.filter(
    ({ net, removed }) => removed || net === null || !named.has(net),
  );
  return (
    <g {...unspoken}>
      {loose.map(({ points, removed }) => (
        <path key={through(points)} className={removed ? "w removed" : "w"} d={through(points)} />
      ))}
      {drawing.dots.map(({ at: [x, y], removed }) => (
        <circle
          key={`${x} ${y}`}
          className={removed ? "dot removed" : "dot"}
          cx={x}
          cy={y}
          r={2.1}
        />
      ))}
    </g>
  );
}
