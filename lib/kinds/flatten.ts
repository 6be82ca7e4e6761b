import type { Place } from "../circuit/place";
import { quoted } from "../values/read-value";
import type { Block, BlockPart, Blocks } from "./block";
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

/** Blocks inside one another. */
const DEEPEST = 200;
const MOST_PARTS = 100_000;

/**
 * Reports blocks that contain themselves or grow too large; whether the circuit can be flattened from `top`.
 * The size is found before anything is copied, so that a few lines cannot ask for a million parts.
 */
export function checkContainment(blocks: Blocks, top: Block): boolean {
  const sizes = new Map<Block, { parts: number; height: number }>();
  const open = new Set<Block>();
  let good = true;

  const measure = (block: Block): { parts: number; height: number } => {
    const known = sizes.get(block);
    if (known !== undefined) return known;
    open.add(block);
    const size = { parts: 0, height: 1 };
    for (const entry of block.entries.values()) {
      const used = entry.entry === "use" ? blocks.get(entry.block) : undefined;
      if (entry.entry !== "use" || used === undefined) {
        size.parts += 1;
        continue;
      }
      const fault = faultOfUse(entry.place, used, open);
      if (fault) {
        good = false;
        continue;
      }
      const inner = measure(used);
      size.parts += inner.parts;
      size.height = Math.max(size.height, inner.height + 1);
    }
    open.delete(block);
    sizes.set(block, size);
    return size;
  };

  for (const block of blocks.values()) measure(block);
  const { parts, height } = measure(top);
  if (parts > MOST_PARTS) {
    const message = `With its blocks put in, the circuit has more than ${MOST_PARTS} parts.`;
    top.place.fault("tooLarge", message);
    return false;
  }
  if (height > DEEPEST) {
    top.place.fault("tooLarge", `The blocks are nested more than ${DEEPEST} deep.`);
    return false;
  }
  return good;
}

function faultOfUse(use: Place, used: Block, open: ReadonlySet<Block>): boolean {
  const place = use.member("block");
  if (open.has(used)) {
    const message = `The block ${quoted(used.name)} contains itself through this use; take it out.`;
    place.fault("blockContainsItself", message);
    return true;
  }
  if (open.size > DEEPEST) {
    place.fault("tooLarge", `The blocks are nested more than ${DEEPEST} deep.`);
    return true;
  }
  return false;
}

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

interface Setting {
  readonly prefix: string;
  readonly fitted: boolean;
  /** The outer nets of the block's ports. */
  readonly ports: ReadonlyMap<string, string>;
}

/** Puts the blocks into the blocks that use them, from `top` down, parts in file order. */
export function flatten(
  blocks: Blocks,
  top: Block,
  reference: string,
  sets: ReadonlyMap<Place, readonly Override[]>,
): readonly FlatPart[] {
  const parts: FlatPart[] = [];
  const overrides = new Map<string, Map<string, ParameterValue>>();

  const place = (block: Block, { prefix, fitted, ports }: Setting): void => {
    const outer = (net: string): string =>
      net === reference ? reference : (ports.get(net) ?? prefix + net);
    for (const entry of block.entries.values()) {
      const path = prefix + entry.ref;
      if (entry.entry === "part") {
        parts.push({
          path,
          source: entry,
          pins: new Map(
            [...entry.pins].map(([pin, net]) => [pin, net === null ? null : outer(net)]),
          ),
          control: entry.control === null ? null : prefix + entry.control,
          of: entry.of === null ? null : [prefix + entry.of[0], prefix + entry.of[1]],
          fitted: fitted && entry.fitted,
          overrides: overrides.get(path) ?? new Map(),
        });
        continue;
      }
      const used = entry.entry === "use" ? blocks.get(entry.block) : undefined;
      if (entry.entry !== "use" || used === undefined) continue;
      addOverrides(overrides, `${path}/`, sets.get(entry.place) ?? []);
      const joined = [...entry.pins].flatMap(([port, net]) =>
        net === null ? [] : [[port, outer(net)] as const],
      );
      place(used, {
        prefix: `${path}/`,
        fitted: fitted && entry.fitted,
        ports: new Map(joined),
      });
    }
  };

  place(top, { prefix: "", fitted: true, ports: new Map() });
  return parts;
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
