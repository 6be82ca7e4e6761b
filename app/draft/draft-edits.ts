import type * as Y from "yjs";
import type { CircuitFile } from "../../lib/circuit/circuit-file";
import type { WireEnd } from "../../lib/circuit/drawing";
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
import type { Projection } from "../../lib/document/projection";
import { catalogue, kinds } from "../../lib/kinds/catalogue";
import type { Parameter } from "../../lib/kinds/parameter";
import type { Kind } from "../../lib/kinds/part";
import type { Selection } from "../sheet/selection";
import type { SheetEditing } from "../sheet/sheet-props";
import type { PartEdits } from "./inspector.client";

type Place = readonly [number, number];

/** What a new part begins with, where its kind has no default: ordinary values that can be solved. */
const FIRST_VALUES: Readonly<Record<string, string>> = {
  resistance: "10k",
  capacitance: "100n",
  inductance: "10 µH",
  coefficient: "0.95",
  gain: "1",
  transconductance: "1 mS",
  transresistance: "1k",
  thresholdVoltage: "2 V",
  transconductanceFactor: "1",
  pinchOffVoltage: "-2 V",
  saturatedDrainCurrent: "10 mA",
  resistance25: "10k",
  beta: "3950",
  position: "0.5",
  ratedVoltage: "12 V",
  ratedPower: "5 W",
  outputVoltage: "5 V",
  voltage: "2.5 V",
  turnsRatio: "1",
  magnetisingInductance: "10 mH",
};

/** A draft's edits, as the sheet and the inspector speak of them: by designator. */
export function draftEdits(doc: Y.Doc, projection: Projection) {
  const { file, idOf } = projection;
  const block = file.top ?? Object.keys(file.blocks)[0] ?? "main";
  const id = (ref: string): string | null => idOf.get(`${block}\n${ref}`) ?? null;
  const withPart = (ref: string, change: (part: string) => void): void => {
    const part = id(ref);
    if (part !== null) change(part);
  };
  const end = (written: WireEnd): DocumentEnd | null => {
    if ("junction" in written) return written;
    const part = id(written.part);
    return part === null ? null : { part, pin: written.pin };
  };
  return {
    block,
    place: (kind: Kind, at: Place): void => {
      addPart(doc, block, kind, at, firstValues(kind), Date.now());
    },
    of: (ref: string): PartEdits => ({
      setParameter: (name, value) => withPart(ref, (part) => setParameter(doc, part, name, value)),
      setRating: (name, value) => withPart(ref, (part) => setRating(doc, part, name, value)),
      turn: () => withPart(ref, (part) => turnPart(doc, part)),
      mirror: () => withPart(ref, (part) => mirrorPart(doc, part)),
      remove: () => withPart(ref, (part) => removePart(doc, part)),
    }),
    disconnect: (ref: string, pin: string): void =>
      withPart(ref, (part) => disconnect(doc, { part, pin })),
    nameNet: (ref: string, pin: string, net: string, at: Place): void =>
      withPart(ref, (part) =>
        nameNet(doc, block, { part, pin }, net, at, net === file.reference ? "ground" : "name"),
      ),
    onSheet: sheetEdits(doc, file, block, withPart, end),
  };
}

export type DraftEdits = ReturnType<typeof draftEdits>;

function sheetEdits(
  doc: Y.Doc,
  file: CircuitFile,
  block: string,
  withPart: (ref: string, change: (part: string) => void) => void,
  end: (written: WireEnd) => DocumentEnd | null,
): SheetEditing {
  return {
    onMove: (ref, at) => withPart(ref, (part) => movePart(doc, part, at)),
    onTurn: (ref) => withPart(ref, (part) => turnPart(doc, part)),
    onMirror: (ref) => withPart(ref, (part) => mirrorPart(doc, part)),
    onRemove: (selection: Selection) => {
      if ("part" in selection) withPart(selection.part, (part) => removePart(doc, part));
    },
    onPlace: (name, at) => {
      const kind = kinds.find((one) => one === name);
      if (kind !== undefined) addPart(doc, block, kind, at, firstValues(kind), Date.now());
    },
    onConnect: (written, target) => {
      const from = end(written);
      if (from === null) return;
      if (!("wire" in target)) {
        const to = end(target);
        if (to !== null) connect(doc, block, from, to);
        return;
      }
      const wire = file.blocks[block]?.wires?.[target.wire];
      const a = wire === undefined ? null : end(wire.a);
      const b = wire === undefined ? null : end(wire.b);
      if (a !== null && b !== null) connectToWire(doc, block, from, { a, b }, target.at);
    },
  };
}

/** Values for the parameters that must be given. */
function firstValues(kind: Kind): Readonly<Record<string, string>> {
  const given = Object.entries<Parameter>(catalogue[kind].parameters).flatMap(
    ([name, parameter]): [string, string][] => {
      if (parameter.form === "choice") return [[name, parameter.words[0] ?? ""]];
      if (parameter.form !== "quantity" || parameter.default !== undefined) return [];
      return [[name, FIRST_VALUES[name] ?? "1"]];
    },
  );
  return Object.fromEntries(given);
}
