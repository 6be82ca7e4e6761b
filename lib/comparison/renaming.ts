import type { CircuitFile, FileLimit, FilePart } from "../circuit/circuit-file";
import { type Matching, partName } from "./matching";

/**
 * The base with the proposed revision's names of nets and designators: what remains different is
 * an edit with meaning, and both sides' results can be laid beside each other.
 */
export function renameBase(
  base: CircuitFile,
  matching: Matching,
  nets: ReadonlyMap<string, string>,
): CircuitFile {
  const refs = new Map(
    matching.pairs.map(({ block, was, is }) => [`${block}\n${was.ref}`, is.ref]),
  );
  const blocks = Object.fromEntries(
    Object.entries(base.blocks).map(([name, block]) => [
      name,
      { ...block, parts: block.parts.map((part) => renamePart(part, name, refs, nets)) },
    ]),
  );
  const top = base.top ?? Object.keys(base.blocks)[0] ?? "";
  const net = (written: string): string => nets.get(`${top}\n${written}`) ?? written;
  const ref = (written: string): string => refs.get(`${top}\n${written}`) ?? written;
  return {
    ...base,
    blocks,
    ...(base.reference !== undefined && { reference: net(base.reference) }),
    ...(base.conditions !== undefined && {
      conditions: base.conditions.map((condition) => ({
        ...condition,
        ...(condition.set !== undefined && {
          set: Object.fromEntries(
            Object.entries(condition.set).map(([address, value]) => {
              const dot = address.lastIndexOf(".");
              return [`${ref(address.slice(0, dot))}${address.slice(dot)}`, value];
            }),
          ),
        }),
      })),
    }),
    ...(base.limits !== undefined && {
      limits: base.limits.map((limit): FileLimit => renameLimit(limit, net, ref)),
    }),
  };
}

function renamePart(
  part: FilePart,
  block: string,
  refs: ReadonlyMap<string, string>,
  nets: ReadonlyMap<string, string>,
): FilePart {
  const ref = (written: string): string => refs.get(`${block}\n${written}`) ?? written;
  return {
    ...part,
    ref: ref(part.ref),
    ...(part.pins !== undefined && {
      pins: Object.fromEntries(
        Object.entries(part.pins).map(([pin, net]) => [
          pin,
          net === null ? null : (nets.get(`${block}\n${net}`) ?? net),
        ]),
      ),
    }),
    ...(part.control !== undefined && { control: ref(part.control) }),
    ...(part.of !== undefined && { of: [ref(part.of[0]), ref(part.of[1])] as const }),
  };
}

function renameLimit(
  limit: FileLimit,
  net: (written: string) => string,
  ref: (written: string) => string,
): FileLimit {
  if ("net" in limit) return { ...limit, net: net(limit.net) };
  if ("between" in limit)
    return { ...limit, between: [net(limit.between[0]), net(limit.between[1])] };
  return { ...limit, part: ref(limit.part) };
}

/** The edits that are a new name and nothing else. */
export function renamingEdits(
  base: CircuitFile,
  matching: Matching,
  nets: ReadonlyMap<string, string>,
) {
  const parts = matching.pairs
    .filter(({ was, is }) => was.ref !== is.ref)
    .map(({ block, was, is }) => ({
      id: `${partName(base, block, is.ref)} renumbered`,
      change: "renumbered" as const,
      part: partName(base, block, is.ref),
      was: was.ref,
      is: is.ref,
    }));
  const renamed = [...nets].map(([key, is]) => {
    const was = key.slice(key.indexOf("\n") + 1);
    return { id: `${is} renamed`, change: "renamed" as const, net: is, was, is };
  });
  return [...parts, ...renamed];
}
