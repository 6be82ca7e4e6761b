import type { CircuitFile } from "../circuit/circuit-file";
import { readCircuitFile } from "../kinds/read-circuit";
import type { ConditionResult } from "../mna/solution";
import type { StressRow } from "../stress/circuit-result";
import { stressRows } from "../stress/stress-rows";
import type { Cause, ComparisonProblem, NetShift, StressShift } from "./comparison";
import type { FileEdit } from "./file-edit";
import { pointResults } from "./point";
import { grayCodeSubsets, shapleyShares } from "./shapley";

/** With more edits than this every subset cannot be solved: those that touch the same part are taken together. */
const MOST_PLAYERS = 8;

/** What one combination of edits comes to, at the operating points. */
interface Outcome {
  readonly conditions: readonly ConditionResult[];
  readonly stress: readonly StressRow[];
}

/** Edits that are made together and share one cause. */
interface Player {
  readonly edits: readonly FileEdit[];
}

export interface Causes {
  readonly causes: readonly Cause[];
  readonly problems: readonly ComparisonProblem[];
}

/**
 * For every loud shift of a node voltage and every margin that shrank: the fair share of each edit,
 * from solving every combination of edits. A combination that cannot be solved makes the shares of
 * its edits unknowable one by one; then they count as one cause, and it is said.
 */
export function causesOf(
  base: CircuitFile,
  edits: readonly FileEdit[],
  loudNets: readonly NetShift[],
  shrunk: readonly StressShift[],
): Causes {
  const moving = edits.filter((edit) => edit.electrical);
  if (moving.length === 0 || (loudNets.length === 0 && shrunk.length === 0))
    return { causes: [], problems: [] };
  const { players, problems } = playersOf(moving);
  const results = solveSubsets(base, players);
  if (results.size < 1 << players.length) {
    return {
      causes: together(moving, loudNets, shrunk),
      problems: [
        ...problems,
        {
          code: "editsInseparable",
          message:
            "Some combinations of the edits cannot be solved alone, so the edits count as one cause together.",
        },
      ],
    };
  }
  const share = (read: (result: Outcome) => number | null): readonly number[] | null => {
    const values = new Map<number, number>();
    for (const [subset, result] of results) {
      const value = read(result);
      if (value === null) return null;
      values.set(subset, value);
    }
    return shapleyShares(players.length, (subset) => values.get(subset) ?? 0);
  };
  const ofNets = loudNets.flatMap((shift) => {
    const shares = share((result) => voltageIn(result, shift));
    return shares === null
      ? []
      : perEdit(players, shares, {
          net: shift.net,
          quantity: "voltage",
          condition: shift.condition,
        });
  });
  const ofMargins = shrunk.flatMap((shift) => {
    const shares = share((result) => marginIn(result, shift));
    return shares === null
      ? []
      : perEdit(players, shares, {
          part: shift.part,
          quantity: "margin",
          rule: shift.rule,
          condition: shift.condition,
        });
  });
  return { causes: [...ofNets, ...ofMargins], problems };
}

function playersOf(edits: readonly FileEdit[]): {
  readonly players: readonly Player[];
  readonly problems: readonly ComparisonProblem[];
} {
  if (edits.length <= MOST_PLAYERS)
    return { players: edits.map((edit) => ({ edits: [edit] })), problems: [] };
  const groups = new Map<string, FileEdit[]>();
  for (const edit of edits) {
    const place = edit.edit.part ?? edit.edit.condition ?? edit.edit.id;
    groups.set(place, [...(groups.get(place) ?? []), edit]);
  }
  let players = [...groups.values()];
  while (players.length > MOST_PLAYERS) {
    const last = players.pop() ?? [];
    players = [...players.slice(0, -1), [...(players.at(-1) ?? []), ...last]];
  }
  return {
    players: players.map((group) => ({ edits: group })),
    problems: [
      {
        code: "editsGrouped",
        message: `${edits.length} edits are too many to combine one by one: they are taken in ${players.length} groups, and an edit's share is its group's share divided evenly.`,
      },
    ],
  };
}

function solveSubsets(base: CircuitFile, players: readonly Player[]): ReadonlyMap<number, Outcome> {
  const results = new Map<number, Outcome>();
  for (const subset of grayCodeSubsets(players.length)) {
    let file = base;
    players.forEach((player, index) => {
      if ((subset & (1 << index)) === 0) return;
      for (const edit of player.edits) file = edit.apply(file);
    });
    const circuit = readCircuitFile(file);
    if (!circuit.ok) continue;
    // Causes are about operating points: a transient is taken at its beginning.
    const conditions = pointResults(circuit.value);
    if (conditions !== null)
      results.set(subset, { conditions, stress: stressRows(circuit.value, conditions, true) });
  }
  return results;
}

function voltageIn(result: Outcome, shift: NetShift): number | null {
  const condition = result.conditions.find((one) => one.name === shift.condition);
  return condition?.nets[shift.net] ?? null;
}

function marginIn(result: Outcome, shift: StressShift): number | null {
  const row = result.stress.find(
    (one) =>
      one.part === shift.part && one.rule.id === shift.rule && one.condition === shift.condition,
  );
  return row?.margin ?? null;
}

function perEdit(
  players: readonly Player[],
  shares: readonly number[],
  of: Omit<Cause, "edit" | "share">,
): readonly Cause[] {
  return players.flatMap((player, index) =>
    player.edits.map((edit) => ({
      edit: edit.edit.id,
      ...of,
      share: (shares[index] ?? 0) / player.edits.length,
    })),
  );
}

/** One cause made of all edits, its share divided evenly. */
function together(
  edits: readonly FileEdit[],
  loudNets: readonly NetShift[],
  shrunk: readonly StressShift[],
): readonly Cause[] {
  const all: readonly Player[] = [{ edits }];
  return [
    ...loudNets.flatMap((shift) =>
      shift.shift === null
        ? []
        : perEdit(all, [shift.shift], {
            net: shift.net,
            quantity: "voltage",
            condition: shift.condition,
          }),
    ),
    ...shrunk.flatMap((shift) =>
      shift.was === null || shift.is === null
        ? []
        : perEdit(all, [shift.is - shift.was], {
            part: shift.part,
            quantity: "margin",
            rule: shift.rule,
            condition: shift.condition,
          }),
    ),
  ];
}
