import { route } from "../../lib/sheet/route";
import { onGrid } from "./sheet-point";
import { through } from "./svg-path";
import type { Wiring } from "./use-wiring";

/** The wire being drawn, dashed. */
export function OpenWireShape({ wiring }: { readonly wiring: Wiring }) {
  const { open } = wiring;
  if (open === null || open.to === null) return null;
  const points = route(
    { at: open.start, outward: null },
    { at: onGrid(open.to), outward: null },
    [],
  );
  return <path className="w opening" d={through(points)} />;
}
