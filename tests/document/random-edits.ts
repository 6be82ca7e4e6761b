import fc from "fast-check";
import type * as Y from "yjs";
import {
  addPart,
  connect,
  connectToWire,
  disconnect,
  mirrorPart,
  movePart,
  nameNet,
  removePart,
  setParameter,
  setRating,
  turnPart,
} from "../../lib/document/edits";
import type { DocumentEnd } from "../../lib/document/ends";
import { topLevel } from "../../lib/document/shape";

const BLOCK = "main";
const KINDS = ["resistor", "capacitor", "opAmp", "connector"] as const;
const PINS = ["1", "2", "out"] as const;

/** Which edit, and what it picks: each number picks among what is there. */
export type RandomEdit = readonly [what: number, first: number, second: number];

export const randomEdit: fc.Arbitrary<RandomEdit> = fc.tuple(fc.nat(12), fc.nat(99), fc.nat(99));

/** Edits a document as a person does, by the product's own edits alone. */
export function editAtRandom(doc: Y.Doc, [what, first, second]: RandomEdit): void {
  const parts = [...topLevel(doc, "parts").keys()].sort();
  const part = parts[first % Math.max(1, parts.length)] ?? "none";
  const other = parts[second % Math.max(1, parts.length)] ?? "none";
  const endOf = (id: string, pin: number): DocumentEnd => ({
    part: id,
    pin: PINS[pin % PINS.length] ?? "1",
  });
  const [a, b] = [endOf(part, second), endOf(other, first)];
  const edits: readonly (() => void)[] = [
    // Of one moment, so that the ids have to tell who is the elder.
    () =>
      addPart(
        doc,
        BLOCK,
        KINDS[first % KINDS.length] ?? "resistor",
        [first, second],
        {},
        second % 3,
      ),
    () => addPart(doc, BLOCK, "resistor", [first, second], { resistance: "1k" }, 7),
    () => connect(doc, BLOCK, a, b),
    () => connect(doc, BLOCK, b, endOf(part, first + 1)),
    () => nameNet(doc, BLOCK, a, `NET${second % 4}`, [first, second]),
    () => nameNet(doc, BLOCK, b, "GND", [first, second], "ground"),
    () => removePart(doc, part),
    () => movePart(doc, part, [first, second]),
    () => turnPart(doc, part),
    () => mirrorPart(doc, part),
    () => setParameter(doc, part, `p${first % 3}`, second % 5 === 0 ? null : `${second}k`),
    () => setRating(doc, part, "power", second),
    () =>
      second % 2 === 0
        ? disconnect(doc, a)
        : connectToWire(doc, BLOCK, endOf(other, second), { a, b }, [first, second]),
  ];
  edits[what]?.();
}
