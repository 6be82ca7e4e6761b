import type { Box } from "../kinds/part-symbol";
import type { Lettering, LetterStyle } from "./sheet-drawing";

/** Size in sheet units, and whether it is set in the narrow or the even-width face. */
const LETTER_SIZES: Readonly<Record<LetterStyle, { size: number; even: boolean }>> = {
  ref: { size: 11, even: false },
  value: { size: 11, even: false },
  net: { size: 10.5, even: false },
  number: { size: 10.5, even: true },
  quiet: { size: 10.5, even: true },
  heading: { size: 12, even: false },
  note: { size: 10.5, even: false },
};

/** Advance widths of the narrow face in hundredths of its size, measured; others count as the widest. */
const WIDTHS = new Map(
  (
    [
      [22, " "],
      [23, "'"],
      [25, "ij"],
      [26, "l"],
      [27, ",."],
      [28, "!:;"],
      [30, "[]"],
      [31, "()·"],
      [32, "f"],
      [33, "t{|}"],
      [35, "r"],
      [36, "-"],
      [38, "/I\\"],
      [42, '"'],
      [43, "°"],
      [44, "?z"],
      [45, "s"],
      [46, "c"],
      [47, "Lvy"],
      [48, "*x"],
      [49, "Jg"],
      [50, "ak"],
      [51, "_eoé"],
      [52, "F"],
      [53, "Thnuµ"],
      [54, "0123456789$+<=>ESZ^`bdpq~−±"],
      [56, "Y"],
      [57, "PV"],
      [58, "CX"],
      [60, "ABKR"],
      [61, "#"],
      [62, "DU"],
      [64, "&GOQ"],
      [65, "HNΩ"],
      [73, "w"],
      [74, "M"],
      [77, "…"],
      [80, "m"],
      [81, "@"],
      [84, "W"],
      [86, "%"],
    ] as const
  ).flatMap(([width, letters]) => [...letters].map((letter) => [letter, width / 100] as const)),
);
const WIDEST = 0.86;
const EVEN = 0.57;

/** How wide a text comes out, in sheet units. */
export function textWidth(text: string, style: LetterStyle): number {
  const { size, even } = LETTER_SIZES[style];
  const letters = [...text];
  if (even) return letters.length * EVEN * size;
  const sum = letters.reduce((total, letter) => total + (WIDTHS.get(letter) ?? WIDEST), 0);
  const spacing = style === "heading" ? 0.14 : style === "net" ? 0.03 : 0;
  return (sum + spacing * letters.length) * size;
}

/** The ink of a lettering: from the top of its capitals to a little under the base line. */
export function letteringBox({ at: [x, y], text, style, anchor }: Lettering): Box {
  const width = textWidth(text, style);
  const left = anchor === "start" ? x : anchor === "end" ? x - width : x - width / 2;
  const { size } = LETTER_SIZES[style];
  return [left, y - 0.72 * size, left + width, y + 0.1 * size];
}

/** A lettering without pencil marks. */
export function letter(
  style: LetterStyle,
  text: string,
  at: Lettering["at"],
  anchor: Lettering["anchor"],
): Lettering {
  return { at, text, style, anchor };
}
