import type { Place } from "../circuit/place";
import { splitAddress } from "../circuit/read-analysis";
import { meaning } from "../values/nearest-word";
import { celsius } from "../values/range";
import { quoted } from "../values/read-value";
import { type Block, type BlockPart, type Blocks, findEntry } from "./block";
import { catalogue, parameterOf } from "./catalogue";
import type { Parameter, ParameterValue } from "./parameter";
import { agree, firstOfTolerance, readParameter } from "./read-parameters";

/** What a `set` gives other values: by path, then by parameter (or `temperature`). */
export interface Override {
  readonly path: string;
  readonly name: string;
  readonly value: ParameterValue;
  /** The half-width that a letter code names for it. */
  readonly tolerance: number | null;
}

/** A part's own temperature is set like a parameter. */
const TEMPERATURE: Parameter = {
  form: "quantity",
  quantity: "temperature",
  range: celsius,
  default: null,
};

/** The settable thing of a part: a parameter, or its temperature. */
export function settable(part: BlockPart, name: string): Parameter | undefined {
  return name === "temperature" ? TEMPERATURE : parameterOf(part.kind, name);
}

/** Reads a `set`; paths lead downward from `block`. */
export function readSet(place: Place | null, blocks: Blocks, block: Block): readonly Override[] {
  const entries = place?.entries() ?? [];
  const keys = new Set(entries.map(([address]) => address));
  return entries.flatMap(
    ([address, value]) => readOverride(address, value, keys, blocks, block) ?? [],
  );
}

function readOverride(
  address: string,
  place: Place,
  keys: ReadonlySet<string>,
  blocks: Blocks,
  block: Block,
): Override | null {
  const target = splitAddress(place, address);
  if (target === null) return null;
  const part = findPart(place, target.part, blocks, block);
  if (part === null) return null;
  const parameter = settable(part, target.name);
  if (parameter === undefined) return noSuchParameter(place, part, target.name);
  const read = readParameter(parameter, place);
  if (read === null) return null;
  if (read.tolerance !== null && !letterFits(place, target, read.tolerance, part, keys))
    return null;
  const together = new Map([...part.parameters, [target.name, read.value]]);
  const contradiction = catalogue[part.kind].contradiction?.(together) ?? null;
  if (contradiction !== null) return place.fault("outOfRange", contradiction.message);
  return { path: target.part, name: target.name, ...read };
}

/** Whether a tolerance letter agrees with what the part states; notes it where the file states nothing. */
function letterFits(
  place: Place,
  target: { readonly part: string; readonly name: string },
  letter: number,
  part: BlockPart,
  keys: ReadonlySet<string>,
): boolean {
  const serving =
    firstOfTolerance(Object.entries(catalogue[part.kind].parameters)) === target.name
      ? "tolerance"
      : `tolerances.${target.name}`;
  const stated = part.statedTolerances.get(target.name);
  const contradicted = keys.has(`${target.part}.${serving}`);
  if (contradicted || (stated !== undefined && !agree(stated, letter))) {
    place.fault("badValue", "The tolerance letter contradicts the tolerance given elsewhere.");
    return false;
  }
  const holder = place.pointer.slice(0, place.pointer.lastIndexOf("/"));
  place.reading.add(holder, `${target.part}.${serving}`, letter);
  return true;
}

/** The part at a path, or null: reported where there is none. */
export function findPart(
  place: Place,
  path: string,
  blocks: Blocks,
  block: Block,
): BlockPart | null {
  const found = findEntry(blocks, block, path);
  if (found === "unclear") return null;
  if (found?.entry.entry === "part") return found.entry;
  const hint =
    found === null ? meaning(path, block.entries.keys()) : "; it is a block, name a part in it.";
  return place.fault("noSuchPart", `There is no part ${quoted(path)}${hint}`);
}

/** Reports that a part has no such parameter. */
export function noSuchParameter(place: Place, part: BlockPart, name: string): null {
  const hint = meaning(name, Object.keys(catalogue[part.kind].parameters));
  const message = `The kind "${part.kind}" has no parameter ${quoted(name)}${hint}`;
  return place.fault("noSuchParam", message);
}
