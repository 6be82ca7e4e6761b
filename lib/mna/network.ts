import type { Circuit, Condition } from "../kinds/circuit";
import type { ControlledBy, Law, Site, Winding } from "../kinds/law";
import { lawOf } from "../kinds/laws";
import type { Part } from "../kinds/part";
import { Unknowns } from "./unknowns";

/** A part with its law, where it stands in one condition. */
export interface PlacedPart {
  readonly part: Part;
  readonly law: Law;
  /** In the order of the law's terminals. */
  readonly pins: readonly string[];
  /** degrees Celsius */
  readonly temperature: number;
}

/** All parts of one condition with their laws. */
export interface Network {
  readonly unknowns: Unknowns;
  readonly parts: readonly PlacedPart[];
  /** Every resistance has its current as an unknown. */
  readonly precise: boolean;
}

/**
 * Gives every part its law and its unknowns.
 * @param precise every resistance gets its current as an unknown: a current that is a difference of nearly
 *   equal voltages (into an open end, say) would be rounding and break Kirchhoff's law
 * @param heated temperatures of parts that heat themselves, degrees Celsius by path
 */
export function networkOf(
  circuit: Circuit,
  condition: Condition,
  precise = false,
  heated: ReadonlyMap<string, number> = new Map(),
): Network {
  const unknowns = new Unknowns(circuit);
  const largestResistance = precise
    ? Number.POSITIVE_INFINITY
    : largestResistanceOf(condition.parts);
  const placed = new Map<string, PlacedPart>();
  const place = (part: Part): void => {
    const temperature = heated.get(part.path) ?? part.temperature ?? condition.ambient;
    const site: Site = {
      temperature,
      largestResistance,
      pin: (name) => unknowns.ofPin(part, name),
      connected: (name) => typeof part.pins[name] === "string",
      current: () => unknowns.ofPart(part.path),
      inner: () => unknowns.ofPart(part.path),
      controlled: part.control === null ? null : currentInto(placed.get(part.control)),
      coupled: part.of === null ? null : windings(part.of, placed),
      start: (pin) => condition.start[part.pins[pin] ?? ""],
    };
    placed.set(part.path, {
      part,
      law: lawOf(part, site),
      pins: Object.keys(part.pins),
      temperature,
    });
  };
  // Parts that lean on another's unknowns come after it; the order of the rest is the file's.
  const later = condition.parts.filter((part) => part.control !== null || part.of !== null);
  for (const part of condition.parts) if (!later.includes(part)) place(part);
  for (const part of inOrderOfControl(later)) place(part);
  return {
    unknowns,
    precise,
    parts: condition.parts.flatMap((part) => placed.get(part.path) ?? []),
  };
}

/** A controlled source may be controlled by another's current: that one first. */
function inOrderOfControl(parts: readonly Part[]): readonly Part[] {
  const waiting = new Map(parts.map((part) => [part.path, part]));
  const order: Part[] = [];
  const visit = (part: Part): void => {
    if (!waiting.delete(part.path)) return;
    const control = part.control === null ? undefined : waiting.get(part.control);
    if (control !== undefined) visit(control);
    order.push(part);
  };
  for (const part of parts) visit(part);
  return order;
}

/** The current into a part's first pin, by the law's own derivatives: they are constant for such parts. */
function currentInto(placed: PlacedPart | undefined): ControlledBy | null {
  if (placed === undefined) return null;
  const { law } = placed;
  const first = law.terminals[0];
  const unknownOfCurrent = law.terminals.find(
    (unknown, index) => index >= placed.pins.length && unknown !== first,
  );
  if (unknownOfCurrent !== undefined) return [{ unknown: unknownOfCurrent, factor: 1 }];
  // The law lists the first pin's own entries first: a resistor has two of them.
  const entries: { unknown: number; factor: number }[] = [];
  const own = law.rows.length / 2;
  for (let k = 0; k < own; k++)
    entries.push({ unknown: law.columns[k] ?? 0, factor: law.g[k] ?? 0 });
  return entries;
}

function windings(
  of: readonly [string, string],
  placed: ReadonlyMap<string, PlacedPart>,
): readonly [Winding, Winding] | null {
  const [one, two] = of.map((path) => windingOf(placed.get(path)));
  return one === undefined || two === undefined ? null : [one, two];
}

function windingOf(placed: PlacedPart | undefined): Winding | undefined {
  if (placed?.part.kind !== "inductor") return undefined;
  const current = placed.law.terminals[2];
  return current === undefined ? undefined : { current, inductance: placed.part.params.inductance };
}

function largestResistanceOf(parts: readonly Part[]): number {
  let largest = 0;
  for (const part of parts) {
    if (part.kind === "resistor") largest = Math.max(largest, part.params.resistance);
    if (part.kind === "switch") largest = Math.max(largest, part.params.openResistance);
  }
  return largest;
}
