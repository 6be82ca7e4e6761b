import type { Place } from "../circuit/place";
import { quoted } from "../values/read-value";
import type { Block, Blocks } from "./block";

/** Blocks inside one another. */
const DEEPEST = 200;
const MOST_PARTS = 100_000;

/**
 * Reports blocks that contain themselves or grow too large; whether the circuit can be flattened from `top`.
 * The size is found before anything is copied, so that a few lines cannot ask for a million parts.
 */
export function checkContainment(blocks: Blocks, top: Block | null): top is Block {
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
      size.parts += 1;
      if (entry.entry !== "use" || used === undefined) continue;
      if (faultOfUse(entry.place, used, open)) {
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
  if (top === null) return false;
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
