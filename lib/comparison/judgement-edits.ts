import type { CircuitFile, FileCondition, FileLimit } from "../circuit/circuit-file";
import type { FileEdit } from "./file-edit";

const NOMINAL: FileCondition = { name: "Nominal" };

/** Conditions added, removed, and changed key by key. */
export function conditionEdits(base: CircuitFile, proposed: CircuitFile): readonly FileEdit[] {
  const before = base.conditions ?? [NOMINAL];
  const after = proposed.conditions ?? [NOMINAL];
  const removed = before
    .filter((condition) => !after.some((one) => one.name === condition.name))
    .map(({ name }) => conditionEdit(name, "removed", {}, (file) => file));
  const added = after
    .filter((condition) => !before.some((one) => one.name === condition.name))
    .map(({ name }) => conditionEdit(name, "added", {}, (file) => file));
  const changed = after.flatMap((is) => {
    const was = before.find((one) => one.name === is.name);
    return was === undefined ? [] : changedCondition(was, is);
  });
  return [...changed, ...added, ...removed];
}

function changedCondition(was: FileCondition, is: FileCondition): readonly FileEdit[] {
  const keys = ["ambient", "analysis", "start", "spread", "selfHeating"] as const;
  const own = keys
    .filter((key) => JSON.stringify(was[key]) !== JSON.stringify(is[key]))
    .map((key) =>
      conditionEdit(is.name, "value", { key, was: was[key], is: is[key] }, (file) =>
        withCondition(file, is.name, (condition) => ({ ...condition, [key]: is[key] })),
      ),
    );
  const before = was.set ?? {};
  const after = is.set ?? {};
  const set = [...new Set([...Object.keys(before), ...Object.keys(after)])]
    .filter((key) => JSON.stringify(before[key]) !== JSON.stringify(after[key]))
    .map((key) =>
      conditionEdit(
        is.name,
        "value",
        { key: `set.${key}`, was: before[key], is: after[key] },
        (file) =>
          withCondition(file, is.name, (condition) => ({
            ...condition,
            set: Object.fromEntries(
              Object.entries({ ...condition.set, [key]: after[key] ?? null }).filter(
                ([name]) => name !== key || after[key] !== undefined,
              ),
            ),
          })),
      ),
    );
  return [...own, ...set];
}

function conditionEdit(
  condition: string,
  change: "added" | "removed" | "value",
  what: { readonly key?: string; readonly was?: unknown; readonly is?: unknown },
  apply: FileEdit["apply"],
): FileEdit {
  const id = change === "value" ? `${condition}.${what.key ?? ""}` : `${condition} ${change}`;
  return {
    edit: {
      id: `condition ${id}`,
      change,
      condition,
      ...(what.key !== undefined && { key: what.key }),
      ...(what.was !== undefined && { was: what.was }),
      ...(what.is !== undefined && { is: what.is }),
    },
    apply,
    // A condition on one side only has nothing to be compared with.
    electrical: change === "value",
    judging: false,
  };
}

function withCondition(
  file: CircuitFile,
  name: string,
  change: (condition: FileCondition) => FileCondition,
): CircuitFile {
  return {
    ...file,
    conditions: (file.conditions ?? [NOMINAL]).map((condition) =>
      condition.name === name ? change(condition) : condition,
    ),
  };
}

/** Limits are known by what they bound and in which condition. */
export function limitEdits(base: CircuitFile, proposed: CircuitFile): readonly FileEdit[] {
  const before = new Map((base.limits ?? []).map((limit) => [limitName(limit), limit]));
  const after = new Map((proposed.limits ?? []).map((limit) => [limitName(limit), limit]));
  const names = new Set([...before.keys(), ...after.keys()]);
  return [...names].flatMap((name): readonly FileEdit[] => {
    const was = before.get(name);
    const is = after.get(name);
    if (was === undefined) return [limitEdit(name, "added", undefined, boundsOf(is))];
    if (is === undefined) return [limitEdit(name, "removed", boundsOf(was), undefined)];
    return boundsOf(was) === boundsOf(is)
      ? []
      : [limitEdit(name, "value", boundsOf(was), boundsOf(is))];
  });
}

function limitEdit(
  limit: string,
  change: "added" | "removed" | "value",
  was: string | undefined,
  is: string | undefined,
): FileEdit {
  return {
    edit: {
      id: `limit ${limit}${change === "value" ? "" : ` ${change}`}`,
      change,
      limit,
      ...(was !== undefined && { was }),
      ...(is !== undefined && { is }),
    },
    apply: (file) => file,
    electrical: false,
    judging: false,
  };
}

function limitName(limit: FileLimit): string {
  const of =
    "net" in limit
      ? limit.net
      : "between" in limit
        ? limit.between.join(" to ")
        : `${limit.part} ${limit.quantity}`;
  return limit.condition === undefined ? of : `${of}, ${limit.condition}`;
}

function boundsOf(limit: FileLimit | undefined): string {
  return `${limit?.min ?? "any"} to ${limit?.max ?? "any"}`;
}

/** The policy and the rules that the file adds. */
export function policyEdits(base: CircuitFile, proposed: CircuitFile): readonly FileEdit[] {
  const was = base.policy ?? { use: "common-practice" };
  const is = proposed.policy ?? { use: "common-practice" };
  if (JSON.stringify(was) === JSON.stringify(is)) return [];
  return [
    {
      edit: { id: "policy", change: "value", policy: is.use ?? "common-practice", was, is },
      apply: (file) => ({ ...file, policy: is }),
      electrical: false,
      judging: true,
    },
  ];
}
