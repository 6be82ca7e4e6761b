import type { Stroke } from "../../lib/kinds/part-symbol";

/** The lines of a part's symbol, in the ink of what holds them. */
export function SymbolStrokes({ strokes }: { readonly strokes: readonly Stroke[] }) {
  return strokes.map(({ path, look }) => <path key={path} className={look} d={path} />);
}
