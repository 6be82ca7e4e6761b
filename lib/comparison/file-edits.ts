import type { CircuitFile, FilePart } from "../circuit/circuit-file";
import type { FileEdit } from "./file-edit";
import { conditionEdits, limitEdits, policyEdits } from "./judgement-edits";
import { type Matching, partName } from "./matching";
import { sameWritten } from "./same-written";
import { structureEdits } from "./structure-edits";

/**
 * The edits between two files whose names agree (see `renameBase`): parts added and removed, values,
 * ratings, connections, conditions, limits, policy, and what only moved on the sheet.
 */
export function fileEdits(
  base: CircuitFile,
  proposed: CircuitFile,
  matching: Matching,
): readonly FileEdit[] {
  const changed = matching.pairs.flatMap(({ block, was, is }) =>
    partEdits(proposed, block, was, is),
  );
  const removed = matching.removed.map(
    ({ block, part }): FileEdit => ({
      edit: {
        id: `${partName(base, block, part.ref)} removed`,
        change: "removed",
        part: partName(base, block, part.ref),
        was: mainValue(part),
      },
      apply: (file) =>
        withParts(file, block, (parts) => parts.filter((one) => one.ref !== part.ref)),
      electrical: part.fitted !== false,
      judging: false,
    }),
  );
  const added = matching.added.map(
    ({ block, part }): FileEdit => ({
      edit: {
        id: `${partName(proposed, block, part.ref)} added`,
        change: "added",
        part: partName(proposed, block, part.ref),
        is: mainValue(part),
      },
      apply: (file) => withParts(file, block, (parts) => [...parts, part]),
      electrical: part.fitted !== false,
      judging: false,
    }),
  );
  return [
    ...changed,
    ...added,
    ...removed,
    ...structureEdits(base, proposed),
    ...conditionEdits(base, proposed),
    ...limitEdits(base, proposed),
    ...policyEdits(base, proposed),
  ];
}

/** Groups of keys that a part is compared by, and how an edit in each is called. */
const GROUPS = [
  { key: "params", change: "value", prefix: "", electrical: true, judging: false },
  { key: "tolerances", change: "value", prefix: "tolerances.", electrical: false, judging: false },
  { key: "set", change: "value", prefix: "set.", electrical: true, judging: false },
  { key: "ratings", change: "rating", prefix: "ratings.", electrical: false, judging: true },
  { key: "pins", change: "connection", prefix: "pins.", electrical: true, judging: false },
] as const;

const SINGLES = [
  { key: "style", electrical: false, judging: true },
  // Where parts heat themselves it moves their laws too.
  { key: "thermal", electrical: true, judging: true },
  { key: "drift", electrical: false, judging: false },
  { key: "temperature", electrical: true, judging: true },
  { key: "fitted", electrical: true, judging: false },
  { key: "control", electrical: true, judging: false },
  { key: "of", electrical: true, judging: false },
  { key: "fit", electrical: true, judging: false },
  { key: "block", electrical: true, judging: false },
] as const;

const DRAWN = ["at", "turn", "mirror"] as const;

function partEdits(
  proposed: CircuitFile,
  block: string,
  was: FilePart,
  is: FilePart,
): readonly FileEdit[] {
  const name = partName(proposed, block, is.ref);
  const edits: FileEdit[] = [];
  for (const group of GROUPS) {
    const before: Readonly<Record<string, unknown>> = was[group.key] ?? {};
    const after: Readonly<Record<string, unknown>> = is[group.key] ?? {};
    for (const key of new Set([...Object.keys(before), ...Object.keys(after)])) {
      if (sameWritten(is.kind, group.key, key, before[key], after[key])) continue;
      edits.push({
        edit: {
          id: `${name}.${group.prefix}${key}`,
          change: group.change,
          part: name,
          key: `${group.prefix}${key}`,
          ...(before[key] !== undefined && { was: before[key] }),
          ...(after[key] !== undefined && { is: after[key] }),
        },
        apply: (file) =>
          withPart(file, block, is.ref, (part) => withMember(part, group.key, key, after[key])),
        electrical: group.electrical,
        judging: group.judging,
      });
    }
  }
  for (const { key, electrical, judging } of SINGLES) {
    if (JSON.stringify(was[key]) === JSON.stringify(is[key])) continue;
    edits.push({
      edit: {
        id: `${name}.${key}`,
        change: "value",
        part: name,
        key,
        ...(was[key] !== undefined && { was: was[key] }),
        ...(is[key] !== undefined && { is: is[key] }),
      },
      apply: (file) => withPart(file, block, is.ref, (part) => withKey(part, key, is[key])),
      electrical,
      judging,
    });
  }
  if (DRAWN.some((key) => JSON.stringify(was[key]) !== JSON.stringify(is[key])))
    edits.push({
      edit: { id: `${name} moved`, change: "moved", part: name },
      apply: (file) => file,
      electrical: false,
      judging: false,
    });
  return edits;
}

/** The value that a part is known by: its kind's first parameter, as written. */
function mainValue(part: FilePart): unknown {
  return Object.values(part.params ?? {})[0] ?? part.kind;
}

function withParts(
  file: CircuitFile,
  block: string,
  change: (parts: readonly FilePart[]) => readonly FilePart[],
): CircuitFile {
  const held = file.blocks[block] ?? { parts: [] };
  return { ...file, blocks: { ...file.blocks, [block]: { ...held, parts: change(held.parts) } } };
}

function withPart(
  file: CircuitFile,
  block: string,
  ref: string,
  change: (part: FilePart) => FilePart,
): CircuitFile {
  return withParts(file, block, (parts) =>
    parts.map((part) => (part.ref === ref ? change(part) : part)),
  );
}

function withMember(
  part: FilePart,
  group: "params" | "tolerances" | "set" | "ratings" | "pins",
  key: string,
  value: unknown,
): FilePart {
  return withKey(
    part,
    group,
    Object.fromEntries(
      Object.entries({ ...part[group], [key]: value }).filter(([, held]) => held !== undefined),
    ),
  );
}

/** The key set, or taken away where the value is undefined. The file's reader checks what comes of it. */
function withKey(part: FilePart, key: string, value: unknown): FilePart {
  const { ref, kind } = part;
  const members = Object.entries(part).filter(([name]) => name !== key);
  return {
    ref,
    kind,
    ...Object.fromEntries(value === undefined ? members : [...members, [key, value]]),
  };
}
