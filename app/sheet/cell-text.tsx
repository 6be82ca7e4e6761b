import { textWidth } from "../../lib/sheet/lettering";

/** Faces of the title block against the lettering that widths are measured in. */
const FACES = {
  tc: { style: "ref", factor: 0.95 },
  tv: { style: "ref", factor: 1.05 },
  tb: { style: "ref", factor: 1.29 },
  tm: { style: "number", factor: 1 },
} as const;

interface CellTextProps {
  readonly look: keyof typeof FACES;
  readonly x: number;
  readonly y: number;
  readonly room: number;
  readonly children: string;
  readonly anchor?: "start" | "end";
  readonly red?: boolean;
}

/** Lettering in a ruled cell. What does not fit is cut with an ellipsis, and stands in full in its title. */
export function CellText({
  look,
  x,
  y,
  room,
  children,
  anchor = "start",
  red = false,
}: CellTextProps) {
  const text = cut(children, FACES[look].style, room / FACES[look].factor);
  return (
    <text className={red ? `${look} red` : look} x={x} y={y} textAnchor={anchor}>
      {text}
      {text !== children && <title>{children}</title>}
    </text>
  );
}

function cut(text: string, style: "ref" | "number", room: number): string {
  if (textWidth(text, style) <= room) return text;
  const letters = [...text];
  while (letters.length > 1 && textWidth(`${letters.join("")}…`, style) > room) letters.pop();
  return `${letters.join("").trimEnd()}…`;
}
