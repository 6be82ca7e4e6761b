import type { CircuitFile } from "../circuit/circuit-file";
import type { Cause, ComparisonProblem, NetShift, StressShift } from "./comparison";
import type { FileEdit } from "./file-edit";
import { type Outcome, outcomesOf } from "./outcomes";
import { type Player, playersOf } from "./players";
import { separableGroups, unionsOf } from "./separable";
import { shapleyShares } from "./shapley";

export interface Causes {
  readonly causes: readonly Cause[];
  readonly problems: readonly ComparisonProblem[];
}

/** One number that moved: what it was and is, and what it is under a combination of edits; null: it has none. */
interface Moved {
  readonly of: Omit<Cause, "edit" | "share">;
  readonly was: number | null;
  readonly is: number | null;
  readonly read: (outcome: Outcome) => number | null;
  /** Whether an edit may have a share in it. */
  readonly touches: (edit: FileEdit) => boolean;
}

/**
 * For every loud shift of a node voltage and every margin that shrank: the fair share of each edit,
 * from solving every combination of edits; the shares add up to the whole. Edits that have no
 * solution without one another count as one cause, its share divided evenly, and it is said.
 */
export function causesOf(
  base: CircuitFile,
  edits: readonly FileEdit[],
  loudNets: readonly NetShift[],
  shrunk: readonly StressShift[],
): Causes {
  const moved = [...loudNets.map(movedVoltage), ...shrunk.map(movedMargin)].filter(
    ({ was, is }) => was !== null && is !== null,
  );
  const able = edits.filter((edit) => moved.some(({ touches }) => touches(edit)));
  if (able.length === 0) return { causes: [], problems: [] };
  const { players, problems } = playersOf(able);
  const outcomes = outcomesOf(base, players);
  const inseparable = new Set<string>();
  const causes = moved.flatMap((one) => sharesOf(one, players, outcomes, inseparable));
  return {
    causes,
    problems: [
      ...problems,
      ...[...inseparable].map((names) => ({
        code: "editsInseparable",
        message: `${names}: some combinations without one another have no solution, so they count as one cause, shared evenly.`,
      })),
    ],
  };
}

function movedVoltage({ net, condition, was, is }: NetShift): Moved {
  return {
    of: { net, quantity: "voltage", condition },
    was,
    is,
    read: ({ conditions }) => conditions.find((one) => one.name === condition)?.nets[net] ?? null,
    touches: (edit) => edit.electrical,
  };
}

function movedMargin({ part, rule, condition, was, is }: StressShift): Moved {
  return {
    of: { part, quantity: "margin", rule, condition },
    was,
    is,
    read: ({ stress }) =>
      stress.find((row) => row.part === part && row.rule.id === rule && row.condition === condition)
        ?.margin ?? null,
    touches: (edit) => edit.electrical || edit.judging,
  };
}

function sharesOf(
  moved: Moved,
  players: readonly Player[],
  outcomes: ReadonlyMap<number, Outcome>,
  inseparable: Set<string>,
): readonly Cause[] {
  const whole = (1 << players.length) - 1;
  const values = new Map([...outcomes].map(([subset, outcome]) => [subset, moved.read(outcome)]));
  // The two ends are as they were judged: so the shares add up to the shift that is shown.
  values.set(0, moved.was);
  values.set(whole, moved.is);
  const value = (subset: number): number | null => values.get(subset) ?? null;
  const groups = separableGroups(players.length, (subset) => value(subset) !== null);
  const unions = unionsOf(groups);
  const shares = shapleyShares(groups.length, (chosen) => value(unions[chosen] ?? 0) ?? Number.NaN);
  return groups.flatMap((group, index) => {
    const members = players.filter((_, player) => (group & (1 << player)) !== 0);
    const edits = members.flat().filter(moved.touches);
    if (members.length > 1 && edits.length > 1)
      inseparable.add(edits.map(({ edit }) => edit.id).join(", "));
    return edits.map((edit) => ({
      edit: edit.edit.id,
      ...moved.of,
      share: (shares[index] ?? Number.NaN) / edits.length,
    }));
  });
}
