import type { Box } from "../../lib/kinds/part-symbol";
import { grown } from "../../lib/sheet/box";
import { textWidth } from "../../lib/sheet/lettering";
import type { Presence } from "./sheet-props";
import { cornersOf, rectOf } from "./svg-path";
import { unspoken } from "./unspoken";

/** Marks at the corners of what the one who looks has picked. */
export function CornerMarks({ box }: { readonly box: Box }) {
  return <path className="corners" d={cornersOf(grown(box, 6))} />;
}

/** A dashed box around what someone else has picked, with their name on its edge. */
export function OthersBox({ box, presence }: { readonly box: Box; readonly presence: Presence }) {
  const around = grown(box, 8);
  const [left, top] = around;
  const words = `${presence.initials} ${presence.name}`;
  const width = textWidth(words, "net") + 10;
  return (
    <g className="others" {...unspoken}>
      <rect className="edge" {...rectOf(around)} />
      <rect className="plate" x={left} y={top - 14} width={width} height={14} />
      <text x={left + 5} y={top - 3.5}>
        {words}
      </text>
    </g>
  );
}
