import type { Place } from "../circuit/place";
import type { Block, BlockPart, Blocks, BlockUse } from "./block";
import { type Override, readSet } from "./override";
import type { ParameterValue } from "./parameter";

/** A part put into the top block: paths and nets are those of the whole circuit. */
export interface FlatPart {
  readonly path: string;
  readonly source: BlockPart;
  readonly pins: ReadonlyMap<string, string | null>;
  readonly control: string | null;
  readonly of: readonly [string, string] | null;
  readonly fitted: boolean;
  /** What the uses of its block set. */
  readonly overrides: Overrides;
}

/** Other values by parameter name; `tolerances.NAME` is a half-width. */
export type Overrides = ReadonlyMap<string, ParameterValue>;

/** What every block's uses set, read once for each block and not for each of its copies. */
export function readSets(blocks: Blocks): ReadonlyMap<Place, readonly Override[]> {
  const sets = new Map<Place, readonly Override[]>();
  for (const block of blocks.values()) {
    for (const entry of block.entries.values()) {
      const used = entry.entry === "use" ? blocks.get(entry.block) : undefined;
      if (entry.entry !== "use" || used === undefined) continue;
      const set = entry.place.member("set");
      sets.set(entry.place, readSet(set.value === undefined ? null : set, blocks, used));
    }
  }
  return sets;
}

/** The parts of the whole circuit, and the nets of those that could not be read. */
export interface Flat {
  readonly parts: readonly FlatPart[];
  readonly looseNets: ReadonlySet<string>;
}

/** Where a copy of a block is put. */
interface Setting {
  readonly prefix: string;
  readonly fitted: boolean;
  /** What a net of the block is called in the whole circuit. */
  readonly outer: (net: string) => string;
}

/** Puts the blocks into the blocks that use them, from `top` down, parts in file order. */
export function flatten(
  blocks: Blocks,
  top: Block,
  reference: string,
  sets: ReadonlyMap<Place, readonly Override[]>,
): Flat {
  const parts: FlatPart[] = [];
  const loose: (string | null)[] = [];
  const overrides = new Map<string, Map<string, ParameterValue>>();

  const put = (block: Block, setting: Setting): void => {
    for (const entry of block.entries.values()) {
      const used = entry.entry === "use" ? blocks.get(entry.block) : undefined;
      if (entry.entry === "part") {
        parts.push(putPart(entry, setting, overrides));
      } else if (entry.entry === "use" && used !== undefined) {
        const inner = settingOf(entry, setting, reference);
        addOverrides(overrides, inner.prefix, sets.get(entry.place) ?? []);
        put(used, inner);
      } else {
        loose.push(...outerPins(entry.pins, setting).values());
      }
    }
  };

  const outer = (net: string): string => net;
  put(top, { prefix: "", fitted: true, outer });
  return { parts, looseNets: new Set(loose.filter((net) => net !== null)) };
}

function putPart(
  part: BlockPart,
  setting: Setting,
  overrides: ReadonlyMap<string, Overrides>,
): FlatPart {
  const { prefix } = setting;
  const path = prefix + part.ref;
  return {
    path,
    source: part,
    pins: outerPins(part.pins, setting),
    control: part.control === null ? null : prefix + part.control,
    of: part.of === null ? null : [prefix + part.of[0], prefix + part.of[1]],
    fitted: setting.fitted && part.fitted,
    overrides: overrides.get(path) ?? new Map(),
  };
}

function outerPins(
  pins: ReadonlyMap<string, string | null>,
  { outer }: Setting,
): ReadonlyMap<string, string | null> {
  return new Map([...pins].map(([pin, net]) => [pin, net === null ? null : outer(net)]));
}

/** Inside a use, a port's net bears the outer name, the reference its own, and every other net the path. */
function settingOf(use: BlockUse, setting: Setting, reference: string): Setting {
  const prefix = `${setting.prefix}${use.ref}/`;
  const joined = outerPins(use.pins, setting);
  const outer = (net: string): string =>
    net === reference ? reference : (joined.get(net) ?? prefix + net);
  return { prefix, fitted: setting.fitted && use.fitted, outer };
}

/** Adds what a `set` gives. What is there already comes from further out, and stays. */
export function addOverrides(
  overrides: Map<string, Map<string, ParameterValue>>,
  prefix: string,
  set: readonly Override[],
): void {
  for (const { path, name, value, tolerance } of set) {
    const own = overrides.get(prefix + path) ?? new Map<string, ParameterValue>();
    overrides.set(prefix + path, own);
    if (own.has(name)) continue;
    own.set(name, value);
    if (tolerance !== null) own.set(`tolerances.${name}`, tolerance);
  }
}
