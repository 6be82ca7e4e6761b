import { type DocumentEnd, endKey } from "./ends";
import type { ProjectionProblem } from "./projection-problem";

/** A pin of a part that stands on the sheet. */
export interface PinOfPart {
  readonly part: string;
  readonly designator: string;
  readonly pin: string;
}

export interface WireBetween {
  readonly a: DocumentEnd;
  readonly b: DocumentEnd;
}

export interface NameAtEnd {
  readonly net: string;
  readonly end: DocumentEnd;
}

/*
 * [PN1] What wires join is one net; what bears one name is one net.
 * [PN2] Of several names on what wires join, the reference wins, then the first in code-point order; it is a problem.
 * [PN3] What bears no name is called after its first pin in code-point order, as `N-R7-2`; if that name is taken, `N-R7-2-2` …
 * [PN4] A pin that nothing is joined to is on no net.
 */

/** The net of every pin of one block, by `endKey`; null: on no net. */
export function namePins(
  pins: readonly PinOfPart[],
  wires: readonly WireBetween[],
  names: readonly NameAtEnd[],
  reference: string,
  block: string,
): {
  readonly netOfPin: ReadonlyMap<string, string | null>;
  readonly problems: readonly ProjectionProblem[];
} {
  const groups = new Groups();
  for (const { a, b } of wires) groups.join(endKey(a), endKey(b));
  const namesOf = new Map<string, Set<string>>();
  for (const { net, end } of names) {
    const root = groups.root(endKey(end));
    namesOf.set(root, (namesOf.get(root) ?? new Set()).add(net));
  }
  const problems: ProjectionProblem[] = [];
  const chosen = new Map<string, string>();
  for (const [root, given] of [...namesOf].sort(([a], [b]) => (a < b ? -1 : 1))) {
    const sorted = [...given].sort();
    const name = given.has(reference) ? reference : (sorted[0] ?? reference);
    chosen.set(root, name);
    if (given.size > 1)
      problems.push({
        code: "netNamedTwice",
        block,
        net: name,
        message: `One net is called ${sorted.join(" and ")}; it counts as ${name}. Take the other names away, or the wire that joins them.`,
      });
  }
  const members = new Map<string, PinOfPart[]>();
  for (const pin of pins) {
    const root = groups.root(endKey({ part: pin.part, pin: pin.pin }));
    members.set(root, [...(members.get(root) ?? []), pin]);
  }
  const taken = new Set(chosen.values());
  const unnamed = [...members]
    .filter(([root]) => !chosen.has(root))
    .map(([root, held]) => ({ root, held, first: held.map(pinWords).sort()[0] ?? "" }))
    .sort((a, b) => (a.first < b.first ? -1 : a.first > b.first ? 1 : a.root < b.root ? -1 : 1));
  for (const { root, held, first } of unnamed) {
    if (held.length < 2) continue;
    let name = `N-${first}`;
    for (let k = 2; taken.has(name); k++) name = `N-${first}-${k}`;
    taken.add(name);
    chosen.set(root, name);
  }
  const netOfPin = new Map<string, string | null>();
  for (const pin of pins) {
    const key = endKey({ part: pin.part, pin: pin.pin });
    netOfPin.set(key, chosen.get(groups.root(key)) ?? null);
  }
  return { netOfPin, problems };
}

/** A name of a net holds no `/` and no `.`; designators and pins of a wild document may. */
function pinWords({ designator, pin }: PinOfPart): string {
  return `${designator}-${pin}`.replace(/[/.\p{Cc}]/gu, "_");
}

class Groups {
  private readonly parent = new Map<string, string>();

  root(key: string): string {
    let at = key;
    for (let up = this.parent.get(at); up !== undefined; up = this.parent.get(at)) at = up;
    return at;
  }

  /** The lesser key becomes the root: the same whatever the order of joining. */
  join(a: string, b: string): void {
    const [one, other] = [this.root(a), this.root(b)];
    if (one === other) return;
    if (one < other) this.parent.set(other, one);
    else this.parent.set(one, other);
  }
}
