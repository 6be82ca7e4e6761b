import type { CircuitFile, FilePart } from "../circuit/circuit-file";

/** A part as it stands in both revisions. */
export interface PartPair {
  readonly block: string;
  readonly was: FilePart;
  readonly is: FilePart;
}

/** Which part of the base is which part of the proposed revision. */
export interface Matching {
  readonly pairs: readonly PartPair[];
  readonly removed: readonly { readonly block: string; readonly part: FilePart }[];
  readonly added: readonly { readonly block: string; readonly part: FilePart }[];
}

/**
 * Matches parts block by block: by id where both sides have it, then by designator, then by kind and
 * connection. `nets` says which nets are only renamed (see `renamedNets`), so that a part which was
 * renumbered and whose net was renamed is known by its connection all the same.
 */
export function matchParts(
  base: CircuitFile,
  proposed: CircuitFile,
  nets: ReadonlyMap<string, string> = new Map(),
): Matching {
  const pairs: PartPair[] = [];
  const removed: { block: string; part: FilePart }[] = [];
  const added: { block: string; part: FilePart }[] = [];
  const blocks = new Set([...Object.keys(base.blocks), ...Object.keys(proposed.blocks)]);
  for (const block of blocks) {
    const were = new Set(base.blocks[block]?.parts ?? []);
    const are = new Set(proposed.blocks[block]?.parts ?? []);
    const sameConnection = (a: FilePart, b: FilePart): boolean =>
      isConnectedAlike(a, b, (net) => nets.get(`${block}\n${net}`) ?? net);
    for (const same of [sameId, sameRef, sameConnection]) {
      for (const was of were) {
        const is = [...are].find((part) => part.kind === was.kind && same(was, part));
        if (is === undefined) continue;
        pairs.push({ block, was, is });
        were.delete(was);
        are.delete(is);
      }
    }
    for (const part of were) removed.push({ block, part });
    for (const part of are) added.push({ block, part });
  }
  return { pairs, removed, added };
}

function sameId(a: FilePart, b: FilePart): boolean {
  return a.id !== undefined && a.id === b.id;
}

/** Two parts with ids of their own are two parts, though one took over the other's designator. */
function sameRef(a: FilePart, b: FilePart): boolean {
  return a.ref === b.ref && (a.id === undefined || b.id === undefined);
}

function isConnectedAlike(a: FilePart, b: FilePart, renamed: (net: string) => string): boolean {
  if (a.id !== undefined && b.id !== undefined) return false;
  const pins = Object.entries(a.pins ?? {});
  return (
    pins.length > 0 &&
    pins.every(([pin, net]) => b.pins?.[pin] === (net === null ? null : renamed(net)))
  );
}

/** How a part is called in edits: its designator, behind the block's name where it is not in the top block. */
export function partName(file: CircuitFile, block: string, ref: string): string {
  const top = file.top ?? Object.keys(file.blocks)[0];
  return block === top ? ref : `${block}/${ref}`;
}
