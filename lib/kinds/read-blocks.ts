import { readName } from "../circuit/names";
import type { Fields, Place } from "../circuit/place";
import { checkDrawing } from "../circuit/read-drawing";
import { meaning } from "../values/nearest-word";
import { quoted } from "../values/read-value";
import { type Block, type BlockEntry, type BlockPart, type Blocks, findEntry } from "./block";
import type { Kind } from "./part";
import { readEntry } from "./read-parts";

const BLOCK_KEYS = ["ports", "parts", "wires", "sheet"];

/** The kinds whose current into `plus` or pin 1 may control another part. */
const CONTROLLING: readonly Kind[] = ["resistor", "inductor", "voltageSource", "vcvs", "ccvs"];

/** Reads every block by itself, then what their parts say of one another. */
export function readBlocks(place: Place, reference: string): Blocks {
  const blocks = new Map<string, Block>();
  for (const [name, block] of place.entries() ?? []) {
    if (name === "") block.fault("badValue", "The name of a block must not be empty; give one.");
    blocks.set(name, readBlock(name, block));
  }
  for (const block of blocks.values()) {
    for (const entry of block.entries.values()) {
      if (entry.entry === "use")
        checkUse(entry.place, entry.pins, blocks.get(entry.block), reference);
      if (entry.entry === "use" && !blocks.has(entry.block)) {
        const hint = meaning(entry.block, blocks.keys());
        const message = `There is no block ${quoted(entry.block)}${hint === "" ? "." : hint}`;
        member(entry.place, "block").fault("noSuchBlock", message);
      }
      if (entry.entry === "part") checkReferences(entry, block, blocks);
    }
  }
  return blocks;
}

function readBlock(name: string, place: Place): Block {
  const fields = place.fields(BLOCK_KEYS);
  if (fields === null) return { name, place, ports: new Set(), entries: new Map() };
  const ports = readPorts(fields.optional("ports"));
  const entries = readEntries(fields);
  const pins = new Map(
    [...entries].map(([ref, entry]) => [
      ref,
      entry.entry === "part" ? new Set(entry.pins.keys()) : null,
    ]),
  );
  checkDrawing(fields, { pins });
  return { name, place, ports, entries };
}

function readPorts(place: Place | null): ReadonlySet<string> {
  const ports = new Set<string>();
  for (const item of place?.items() ?? []) {
    const port = readName(item);
    if (port === null) continue;
    if (ports.has(port))
      item.fault("duplicateName", `The port "${port}" is listed twice; keep one.`);
    ports.add(port);
  }
  return ports;
}

function readEntries(fields: Fields): ReadonlyMap<string, BlockEntry> {
  const entries = new Map<string, BlockEntry>();
  const ids = new Set<string>();
  for (const place of fields.required("parts")?.items() ?? []) {
    const entry = readEntry(place);
    if (entry === null) continue;
    if (entries.has(entry.ref)) {
      const message = `The designator "${entry.ref}" is taken; give this part another.`;
      member(place, "ref").fault("duplicateRef", message);
      continue;
    }
    entries.set(entry.ref, entry);
    if (entry.entry !== "part" || entry.id === null) continue;
    if (ids.has(entry.id)) {
      const message = `The id ${quoted(entry.id)} is another part's; each needs its own.`;
      member(place, "id").fault("duplicateName", message);
    }
    ids.add(entry.id);
  }
  return entries;
}

/** Whether the pins of a use of a block are ports of it. */
function checkUse(
  place: Place,
  pins: ReadonlyMap<string, string | null>,
  used: Block | undefined,
  reference: string,
): void {
  if (used === undefined) return;
  for (const [pin, net] of pins) {
    if (!used.ports.has(pin)) {
      const ports = [...used.ports];
      const hint = meaning(pin, ports);
      const names = ports.length === 0 ? "It has none." : `Its ports are ${ports.join(", ")}.`;
      const message = `The block "${used.name}" has no port ${quoted(pin)}${hint === "" ? `. ${names}` : hint}`;
      member(member(place, "pins"), pin).fault("unknownPin", message);
    } else if (pin === reference && net !== null && net !== reference) {
      const message = `The port "${pin}" is the reference, which is one net in every block; join it to "${reference}".`;
      member(member(place, "pins"), pin).fault("badValue", message);
    }
  }
}

/** Whether `control` and `of` lead to fitted parts of a kind that can serve. */
function checkReferences(part: BlockPart, block: Block, blocks: Blocks): void {
  if (part.control !== null) {
    const place = member(part.place, "control");
    checkTarget(place, part.control, CONTROLLING, { part, block, blocks });
  }
  if (part.of === null) return;
  const place = member(part.place, "of");
  const [first, second] = part.of;
  checkTarget(member(place, 0), first, ["inductor"], { part, block, blocks });
  checkTarget(member(place, 1), second, ["inductor"], { part, block, blocks });
  if (first === second) place.fault("badValue", "A coupling is of two different inductors.");
}

function checkTarget(
  place: Place,
  path: string,
  allowed: readonly Kind[],
  { part, block, blocks }: { part: BlockPart; block: Block; blocks: Blocks },
): void {
  const found = findEntry(blocks, block, path);
  if (found === "unclear") return;
  if (found === null) {
    const hint = meaning(path, block.entries.keys());
    place.fault("noSuchPart", `There is no part ${quoted(path)}${hint === "" ? "." : hint}`);
  } else if (found.entry.entry === "use" || !allowed.includes(found.entry.kind)) {
    place.fault(
      "badValue",
      `${quoted(path)} cannot serve here; it must be one of: ${allowed.join(", ")}.`,
    );
  } else if (part.fitted && !found.fitted) {
    place.fault("noSuchPart", `The part ${quoted(path)} is not fitted, but ${part.ref} needs it.`);
  }
}

function member(place: Place, key: string | number): Place {
  return place.member(key);
}
