import type { Lettering, LetterStyle } from "../../lib/sheet/sheet-drawing";

const CLASSES: Readonly<Record<LetterStyle, string>> = {
  ref: "ref",
  value: "val",
  net: "net",
  number: "v",
  quiet: "v q",
  heading: "sec",
  note: "gn",
};
const PENCIL = { was: "grn gone", past: "red" } as const;

/** Lettering on the sheet; what is struck is green and has a line through it. */
export function Letters({ letters }: { readonly letters: readonly Lettering[] }) {
  return letters.map(({ at: [x, y], text, style, anchor, pencil }) => (
    <text
      key={`${x} ${y} ${text}`}
      className={pencil === undefined ? CLASSES[style] : `${CLASSES[style]} ${PENCIL[pencil]}`}
      x={x}
      y={y}
      textAnchor={anchor}
    >
      {text}
    </text>
  ));
}
