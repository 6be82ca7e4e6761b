import type { Point } from "./drawing";
import type { Fields, Place } from "./place";

const SIZES = ["A4", "A3", "A2", "A1", "A0"] as const;
const LABEL_SHAPES = ["ground", "flag", "name"] as const;
const TEXT_STYLES = ["heading", "note"] as const;

/** Checks where a part is drawn, and how it is turned. */
export function checkPlacing(fields: Fields): Point | null {
  fields.optional("turn")?.count(0, 3);
  fields.optional("mirror")?.flag();
  const at = fields.optional("at");
  return at === null ? null : readPoint(at);
}

/** What the wires of a block may be tied to. */
export interface Drawn {
  /** The pins of each part of the block; null: not known. */
  readonly pins: ReadonlyMap<string, ReadonlySet<string> | null>;
}

/** Checks the wires and the sheet of a block: solving never reads them, but what they name must exist. */
export function checkDrawing(fields: Fields, drawn: Drawn): void {
  const sheet = fields.optional("sheet");
  const members = sheet?.fields(["size", "junctions", "labels", "texts"]) ?? null;
  const junctions = new Set<string>();
  members?.required("size")?.choice(SIZES);
  for (const [id, place] of members?.required("junctions")?.entries() ?? []) {
    junctions.add(id);
    readPoint(place);
  }
  for (const label of members?.required("labels")?.items() ?? []) {
    checkLabel(label, drawn, junctions);
  }
  for (const text of members?.required("texts")?.items() ?? []) checkText(text);
  for (const wire of fields.optional("wires")?.items() ?? []) {
    const ends = wire.fields(["a", "b"]);
    for (const key of ["a", "b"]) {
      const end = ends?.required(key) ?? null;
      if (end !== null) checkEnd(end, drawn, junctions);
    }
  }
}

function checkLabel(place: Place, drawn: Drawn, junctions: ReadonlySet<string>): void {
  const fields = place.fields(["shape", "net", "at", "end"]);
  if (fields === null) return;
  fields.required("shape")?.choice(LABEL_SHAPES);
  fields.required("net")?.text();
  const at = fields.required("at");
  if (at !== null) readPoint(at);
  const end = fields.required("end");
  if (end !== null) checkEnd(end, drawn, junctions);
}

function checkText(place: Place): void {
  const fields = place.fields(["at", "text", "style"]);
  if (fields === null) return;
  const at = fields.required("at");
  if (at !== null) readPoint(at);
  fields.required("text")?.text();
  fields.required("style")?.choice(TEXT_STYLES);
}

function checkEnd(place: Place, drawn: Drawn, junctions: ReadonlySet<string>): void {
  const fields = place.fields(["part", "pin", "junction"]);
  if (fields === null) return;
  const junction = fields.optional("junction");
  if (junction !== null) {
    const id = junction.text();
    if (id !== null && !junctions.has(id)) {
      junction.fault("badValue", `The sheet has no junction "${id}"; add it or mend the end.`);
    }
    for (const key of ["part", "pin"]) {
      fields.optional(key)?.fault("unknownKey", "An end at a junction names no part and no pin.");
    }
    return;
  }
  const part = fields.required("part");
  const pin = fields.required("pin");
  const ref = part?.text() ?? null;
  const name = pin?.text() ?? null;
  if (ref === null) return;
  const pins = drawn.pins.get(ref);
  if (pins === undefined) {
    part?.fault("noSuchPart", `The block has no part "${ref}" for this end.`);
  } else if (pins !== null && name !== null && !pins.has(name)) {
    pin?.fault("unknownPin", `The part "${ref}" has no pin "${name}".`);
  }
}

function readPoint(place: Place): Point | null {
  const [x, y, more] = Array.isArray(place.value) ? (place.items() ?? []) : [];
  if (typeof x?.value === "number" && typeof y?.value === "number" && more === undefined) {
    return [x.value, y.value];
  }
  return place.fault("wrongType", "A point is a list of two numbers, x and y.");
}
