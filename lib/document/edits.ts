import * as Y from "yjs";
import { catalogue } from "../kinds/catalogue";
import type { Kind } from "../kinds/part";
import { type DocumentEnd, endKey, endOf } from "./ends";
import { objectOf, textOf } from "./plain";
import { nextFree } from "./project-parts";
import { CIRCUIT_TYPES, entriesOf, freshId, topLevel } from "./shape";

/** The origin of a person's own edits: undo reaches these and nobody else's. @internal to this layer and its tests */
export const OWN_EDIT = "own edit";

export type Place = readonly [x: number, y: number];

/** Undo and redo over the circuit, for the own edits alone; another's later change of the same thing stays. */
export function undoOf(doc: Y.Doc): Y.UndoManager {
  return new Y.UndoManager(
    CIRCUIT_TYPES.map((name) => topLevel(doc, name)),
    { trackedOrigins: new Set([OWN_EDIT]), captureTimeout: 0 },
  );
}

/** Sets a parameter as written; null takes it away, so that its default counts. */
export function setParameter(doc: Y.Doc, part: string, name: string, value: unknown): void {
  setMember(doc, part, "params", name, value);
}

/** Sets a rating as written; null takes it away. */
export function setRating(doc: Y.Doc, part: string, name: string, value: unknown): void {
  setMember(doc, part, "ratings", name, value);
}

function setMember(
  doc: Y.Doc,
  part: string,
  group: "params" | "ratings",
  name: string,
  value: unknown,
): void {
  edit(doc, () => {
    const map = partOf(doc, part);
    if (map === null) return;
    let members = map.get(group);
    if (!(members instanceof Y.Map)) {
      members = new Y.Map();
      map.set(group, members);
    }
    if (!(members instanceof Y.Map)) return;
    if (value === null) members.delete(name);
    else members.set(name, value);
  });
}

/** First letters of the designators of each kind, as the trade has them. */
const LETTERS: Readonly<Record<Kind, string>> = {
  resistor: "R",
  capacitor: "C",
  inductor: "L",
  coupling: "M",
  voltageSource: "V",
  currentSource: "I",
  vcvs: "E",
  vccs: "G",
  ccvs: "H",
  cccs: "F",
  diode: "D",
  zener: "D",
  led: "D",
  schottky: "D",
  bjt: "Q",
  mosfet: "Q",
  jfet: "Q",
  opAmp: "U",
  comparator: "U",
  switch: "S",
  thermistor: "RT",
  potentiometer: "RV",
  fuse: "F",
  relayCoil: "K",
  lamp: "E",
  linearRegulator: "U",
  voltageReference: "U",
  optocoupler: "U",
  transformer: "T",
  connector: "J",
  testPoint: "TP",
};

/** Places a part of a kind with the next free designator. @returns the part's id */
export function addPart(
  doc: Y.Doc,
  block: string,
  kind: Kind,
  at: Place,
  params: Readonly<Record<string, unknown>>,
  now: number,
): string {
  const id = freshId();
  edit(doc, () => {
    const taken = new Set(
      entriesOf(topLevel(doc, "parts")).flatMap(([, map]) => {
        const designator = map.get("block") === block ? textOf(map.get("designator")) : null;
        return designator === null ? [] : [designator];
      }),
    );
    const map = new Y.Map<unknown>();
    map.set("block", block);
    map.set("kind", kind);
    map.set("designator", nextFree(`${LETTERS[kind]}1`, taken, taken));
    map.set("born", now);
    map.set("at", [at[0], at[1], 0, false]);
    map.set("params", new Y.Map(Object.entries(params)));
    map.set("ratings", new Y.Map());
    const { pins } = catalogue[kind];
    if (pins === "any") map.set("pins", ["1"]);
    topLevel(doc, "parts").set(id, map);
  });
  return id;
}

/** Removes a part with its wires and labels. */
export function removePart(doc: Y.Doc, part: string): void {
  edit(doc, () => {
    for (const name of ["wires", "labels"] as const)
      for (const [id, value] of topLevel(doc, name).entries()) {
        const entry = objectOf(value);
        const ends = [entry?.["a"], entry?.["b"], entry?.["end"]].map(endOf);
        if (ends.some((end) => end !== null && "part" in end && end.part === part))
          topLevel(doc, name).delete(id);
      }
    topLevel(doc, "parts").delete(part);
  });
}

/** Moves a part. */
export function movePart(doc: Y.Doc, part: string, at: Place): void {
  place(doc, part, (held) => [at[0], at[1], held.turn, held.mirror]);
}

/** Turns a part by a quarter, clockwise. */
export function turnPart(doc: Y.Doc, part: string): void {
  place(doc, part, (held) => [held.x, held.y, (held.turn + 1) % 4, held.mirror]);
}

/** Mirrors a part about the vertical. */
export function mirrorPart(doc: Y.Doc, part: string): void {
  place(doc, part, (held) => [held.x, held.y, held.turn, !held.mirror]);
}

/** Draws a wire between two ends; one that is there already is not drawn again. */
export function connect(doc: Y.Doc, block: string, a: DocumentEnd, b: DocumentEnd): void {
  const keys = [endKey(a), endKey(b)].sort().join();
  edit(doc, () => {
    for (const value of topLevel(doc, "wires").values()) {
      const entry = objectOf(value);
      const [one, other] = [endOf(entry?.["a"]), endOf(entry?.["b"])];
      if (one !== null && other !== null && [endKey(one), endKey(other)].sort().join() === keys)
        return;
    }
    topLevel(doc, "wires").set(freshId(), { block, a, b });
  });
}

/** Puts a junction on a wire and joins a new wire to it: the old wire becomes two. */
export function connectToWire(
  doc: Y.Doc,
  block: string,
  from: DocumentEnd,
  wire: { readonly a: DocumentEnd; readonly b: DocumentEnd },
  at: Place,
): void {
  edit(doc, () => {
    const junction = freshId();
    topLevel(doc, "junctions").set(junction, { block, at: [at[0], at[1]] });
    const keys = [endKey(wire.a), endKey(wire.b)].sort().join();
    for (const [id, value] of topLevel(doc, "wires").entries()) {
      const entry = objectOf(value);
      const [a, b] = [endOf(entry?.["a"]), endOf(entry?.["b"])];
      if (a !== null && b !== null && [endKey(a), endKey(b)].sort().join() === keys)
        topLevel(doc, "wires").delete(id);
    }
    for (const end of [wire.a, wire.b, from])
      topLevel(doc, "wires").set(freshId(), { block, a: end, b: { junction } });
  });
}

/** Takes away every wire and label at a pin. */
export function disconnect(doc: Y.Doc, end: DocumentEnd): void {
  const key = endKey(end);
  edit(doc, () => {
    for (const name of ["wires", "labels"] as const)
      for (const [id, value] of topLevel(doc, name).entries()) {
        const entry = objectOf(value);
        const ends = [entry?.["a"], entry?.["b"], entry?.["end"]].map(endOf);
        if (ends.some((one) => one !== null && endKey(one) === key)) topLevel(doc, name).delete(id);
      }
  });
}

/** Names the net at a pin: as plain lettering, or with the reference symbol. */
export function nameNet(
  doc: Y.Doc,
  block: string,
  end: DocumentEnd,
  net: string,
  at: Place,
  shape: "name" | "ground" = "name",
): void {
  edit(doc, () => {
    topLevel(doc, "labels").set(freshId(), { block, shape, net, at: [at[0], at[1]], end });
  });
}

function edit(doc: Y.Doc, change: () => void): void {
  doc.transact(change, OWN_EDIT);
}

function partOf(doc: Y.Doc, id: string): Y.Map<unknown> | null {
  const map = topLevel(doc, "parts").get(id);
  return map instanceof Y.Map ? map : null;
}

interface HeldPlace {
  readonly x: number;
  readonly y: number;
  readonly turn: number;
  readonly mirror: boolean;
}

function place(
  doc: Y.Doc,
  part: string,
  moved: (held: HeldPlace) => readonly [number, number, number, boolean],
): void {
  edit(doc, () => {
    const map = partOf(doc, part);
    if (map === null) return;
    const at = map.get("at");
    const [x, y, turn, mirror]: readonly unknown[] = Array.isArray(at) ? at : [];
    map.set("at", [
      ...moved({
        x: typeof x === "number" ? x : 0,
        y: typeof y === "number" ? y : 0,
        turn: typeof turn === "number" ? turn : 0,
        mirror: mirror === true,
      }),
    ]);
  });
}
