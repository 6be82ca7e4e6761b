import { readName } from "../circuit/names";
import type { Fields, Place } from "../circuit/place";
import { checkDrawing } from "../circuit/read-drawing";
import { meaning } from "../values/nearest-word";
import { quoted } from "../values/read-value";
import {
  type Block,
  type BlockEntry,
  type BlockPart,
  type Blocks,
  type BlockUse,
  findEntry,
} from "./block";
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
      if (entry.entry === "use") checkUse(entry, blocks, reference);
      if (entry.entry === "part") checkReferences(entry, block, blocks);
    }
  }
  return blocks;
}

function readBlock(name: string, place: Place): Block {
  const fields = place.fields(BLOCK_KEYS);
  if (fields === null) return { name, place, ports: new Set(), entries: new Map(), clear: false };
  const ports = readPorts(fields.optional("ports"));
  const { entries, clear } = readEntries(fields);
  const pins = new Map(
    [...entries].map(([ref, entry]) => [
      ref,
      entry.entry === "part" ? new Set(entry.pins.keys()) : null,
    ]),
  );
  checkDrawing(fields, { pins });
  return { name, place, ports, entries, clear };
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

function readEntries(fields: Fields): Pick<Block, "entries" | "clear"> {
  const entries = new Map<string, BlockEntry>();
  const ids = new Set<string>();
  const items = fields.required("parts")?.items() ?? null;
  for (const place of items ?? []) {
    const entry = readEntry(place);
    if (entry === null) continue;
    if (entries.has(entry.ref)) {
      const message = `The designator "${entry.ref}" is taken; give this part another.`;
      place.member("ref").fault("duplicateRef", message);
      continue;
    }
    entries.set(entry.ref, entry);
    if (entry.entry !== "part" || entry.id === null) continue;
    if (ids.has(entry.id)) {
      const message = `The id ${quoted(entry.id)} is another part's; each needs its own.`;
      place.member("id").fault("duplicateName", message);
    }
    ids.add(entry.id);
  }
  const clear = [...entries.values()].every((entry) => entry.entry !== "broken" || entry.clear);
  return { entries, clear: clear && entries.size === items?.length };
}

/** Whether the block of a use exists, and its pins are ports of it. */
function checkUse(use: BlockUse, blocks: Blocks, reference: string): void {
  const used = blocks.get(use.block);
  if (used === undefined) {
    const hint = meaning(use.block, blocks.keys());
    use.place.member("block").fault("noSuchBlock", `There is no block ${quoted(use.block)}${hint}`);
    return;
  }
  for (const [pin, net] of use.pins) {
    const place = use.place.member("pins").member(pin);
    if (!used.ports.has(pin)) {
      const ports = [...used.ports];
      const hint = meaning(pin, ports);
      const names = ports.length === 0 ? "It has none." : `Its ports are ${ports.join(", ")}.`;
      const end = hint === "." ? `. ${names}` : hint;
      place.fault("unknownPin", `The block "${used.name}" has no port ${quoted(pin)}${end}`);
    } else if (pin === reference && net !== null && net !== reference) {
      const message = `The port "${pin}" is the reference, which is one net in every block; join it to "${reference}".`;
      place.fault("badValue", message);
    }
  }
}

/** Whether `control` and `of` lead to fitted parts of a kind that can serve. */
function checkReferences(part: BlockPart, block: Block, blocks: Blocks): void {
  if (part.control !== null) {
    const place = part.place.member("control");
    checkTarget(place, part.control, CONTROLLING, { part, block, blocks });
  }
  if (part.of === null) return;
  const place = part.place.member("of");
  const [first, second] = part.of;
  checkTarget(place.member(0), first, ["inductor"], { part, block, blocks });
  checkTarget(place.member(1), second, ["inductor"], { part, block, blocks });
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
    place.fault("noSuchPart", `There is no part ${quoted(path)}${hint}`);
  } else if (found.entry.entry === "use" || !allowed.includes(found.entry.kind)) {
    place.fault(
      "badValue",
      `${quoted(path)} cannot serve here; it must be one of: ${allowed.join(", ")}.`,
    );
  } else if (part.fitted && !found.fitted) {
    place.fault("noSuchPart", `The part ${quoted(path)} is not fitted, but ${part.ref} needs it.`);
  }
}
