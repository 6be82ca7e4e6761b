import * as Y from "yjs";
import type { CircuitFile, FileBlock, FilePart } from "../circuit/circuit-file";
import type { WireEnd } from "../circuit/drawing";
import { placeSymbol } from "../sheet/pin-place";
import { placeParts } from "../sheet/placing";
import { type DocumentEnd, endKey } from "./ends";
import { SCHEMA, topLevel } from "./shape";

/** Members of a part that stand as they are: whoever changes one changes it whole. */
const WHOLE = [
  "thermal",
  "style",
  "fit",
  "tolerances",
  "drift",
  "temperature",
  "fitted",
  "note",
  "set",
] as const;

/**
 * Writes a circuit file into an empty document, in one transaction; the server alone does this, once
 * for each design. A pin whose net no wire gives it gets a name at the pin, so that any file, drawn
 * or not, keeps its connections. `newId` makes ids for what has none.
 */
export function writeCircuitFile(doc: Y.Doc, file: CircuitFile, newId: () => string): void {
  doc.transact(() => {
    const ids = partIds(file, newId);
    const top = file.top ?? Object.keys(file.blocks)[0] ?? "main";
    const design = topLevel(doc, "design");
    design.set("schema", SCHEMA);
    design.set("title", file.title ?? "");
    design.set("top", top);
    design.set("reference", file.reference ?? "GND");
    let born = 0;
    for (const [name, block] of Object.entries(file.blocks)) {
      topLevel(doc, "blocks").set(name, {
        ...(block.ports !== undefined && { ports: block.ports }),
        size: block.sheet?.size ?? placeParts(block).sheet.size,
      });
      const { placings } = placeParts(block);
      block.parts.forEach((part, index) => {
        const placing = placings[index] ?? { at: [0, 0] as const, turn: 0, mirror: false };
        born += 1;
        const id = ids.get(`${name}\n${part.ref}`) ?? newId();
        topLevel(doc, "parts").set(id, partMap(part, name, born, placing, ids));
      });
      writeDrawing(doc, name, block, ids, newId);
    }
    writeJudgement(doc, file, top, ids, newId);
  });
}

function partIds(file: CircuitFile, newId: () => string): ReadonlyMap<string, string> {
  const ids = new Map<string, string>();
  const taken = new Set<string>();
  for (const [name, block] of Object.entries(file.blocks))
    for (const part of block.parts) {
      const own = part.id;
      const id = own !== undefined && own !== "" && !taken.has(own) ? own : newId();
      taken.add(id);
      ids.set(`${name}\n${part.ref}`, id);
    }
  return ids;
}

function partMap(
  part: FilePart,
  block: string,
  born: number,
  placing: {
    readonly at: readonly [number, number];
    readonly turn: number;
    readonly mirror: boolean;
  },
  ids: ReadonlyMap<string, string>,
): Y.Map<unknown> {
  const map = new Y.Map<unknown>();
  map.set("block", block);
  map.set("kind", part.kind);
  map.set("designator", part.ref);
  map.set("born", born);
  // A place is one value: x and y apart would tear in a merge.
  map.set("at", [placing.at[0], placing.at[1], placing.turn, placing.mirror]);
  map.set("params", new Y.Map(Object.entries(part.params ?? {})));
  map.set("ratings", new Y.Map(Object.entries(part.ratings ?? {})));
  map.set("pins", Object.keys(part.pins ?? {}));
  for (const key of WHOLE) if (part[key] !== undefined) map.set(key, part[key]);
  // `block` says where the part stands; which block it uses has a name of its own.
  if (part.block !== undefined) map.set("uses", part.block);
  const idOf = (ref: string): string => ids.get(`${block}\n${ref}`) ?? ref;
  if (part.control !== undefined) map.set("control", idOf(part.control));
  if (part.of !== undefined) map.set("of", part.of.map(idOf));
  return map;
}

function writeDrawing(
  doc: Y.Doc,
  name: string,
  block: FileBlock,
  ids: ReadonlyMap<string, string>,
  newId: () => string,
): void {
  const junctions = new Map<string, string>();
  for (const [junction, at] of Object.entries(block.sheet?.junctions ?? {})) {
    const id = newId();
    junctions.set(junction, id);
    topLevel(doc, "junctions").set(id, { block: name, at: [...at] });
  }
  const end = (written: WireEnd): DocumentEnd =>
    "junction" in written
      ? { junction: junctions.get(written.junction) ?? written.junction }
      : { part: ids.get(`${name}\n${written.part}`) ?? written.part, pin: written.pin };
  const joined = new Joined();
  for (const wire of block.wires ?? []) {
    const [a, b] = [end(wire.a), end(wire.b)];
    topLevel(doc, "wires").set(newId(), { block: name, a, b });
    joined.join(endKey(a), endKey(b));
  }
  for (const label of block.sheet?.labels ?? []) {
    const at = end(label.end);
    topLevel(doc, "labels").set(newId(), {
      block: name,
      shape: label.shape,
      net: label.net,
      at: [...label.at],
      end: at,
    });
    joined.name(endKey(at), label.net);
  }
  for (const text of block.sheet?.texts ?? [])
    topLevel(doc, "texts").set(newId(), { block: name, ...text, at: [...text.at] });

  const { placings } = placeParts(block);
  block.parts.forEach((part, index) => {
    const placing = placings[index];
    const drawn = placing === undefined ? [] : placeSymbol(part, placing).pins;
    for (const [pin, net] of Object.entries(part.pins ?? {})) {
      const own = end({ part: part.ref, pin });
      if (net === null || joined.nameOf(endKey(own)) === net) continue;
      const at = drawn.find((one) => one.name === pin)?.at ?? [0, 0];
      topLevel(doc, "labels").set(newId(), {
        block: name,
        shape: "name",
        net,
        at: [...at],
        end: own,
      });
      joined.name(endKey(own), net);
    }
  });
}

function writeJudgement(
  doc: Y.Doc,
  file: CircuitFile,
  top: string,
  ids: ReadonlyMap<string, string>,
  newId: () => string,
): void {
  // The first step of a path is a part of the top block; it is kept by id, so that renumbering does not lose it.
  const byId = (path: string): string => {
    const [first = "", ...rest] = path.split("/");
    const id = ids.get(`${top}\n${first}`);
    return id === undefined ? path : [`#${id}`, ...rest].join("/");
  };
  (file.conditions ?? [{ name: "Nominal" }]).forEach((condition, order) => {
    const { set, ...rest } = condition;
    const map = new Y.Map<unknown>(Object.entries({ ...rest, order }));
    const overrides = Object.entries(set ?? {}).map(([address, value]): [string, unknown] => {
      const dot = address.lastIndexOf(".");
      return [`${byId(address.slice(0, dot))}${address.slice(dot)}`, value];
    });
    map.set("set", new Y.Map(overrides));
    topLevel(doc, "conditions").set(newId(), map);
  });
  (file.limits ?? []).forEach((limit, order) => {
    const kept = "part" in limit ? { ...limit, part: byId(limit.part) } : limit;
    topLevel(doc, "limits").set(newId(), new Y.Map<unknown>(Object.entries({ ...kept, order })));
  });
  topLevel(doc, "policy").set("choice", file.policy ?? { use: "common-practice" });
}

/** Ends that wires join, and the name that a label gives them. */
class Joined {
  private readonly parent = new Map<string, string>();
  private readonly names = new Map<string, string>();

  join(a: string, b: string): void {
    const [one, other] = [this.root(a), this.root(b)];
    if (one === other) return;
    this.parent.set(one, other);
    const name = this.names.get(one);
    if (name !== undefined && !this.names.has(other)) this.names.set(other, name);
  }

  name(end: string, name: string): void {
    const root = this.root(end);
    if (!this.names.has(root)) this.names.set(root, name);
  }

  nameOf(end: string): string | undefined {
    return this.names.get(this.root(end));
  }

  private root(end: string): string {
    let at = end;
    for (let up = this.parent.get(at); up !== undefined; up = this.parent.get(at)) at = up;
    return at;
  }
}
