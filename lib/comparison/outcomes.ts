import type { CircuitFile } from "../circuit/circuit-file";
import { readCircuitFile } from "../kinds/read-circuit";
import type { ConditionResult } from "../mna/solution";
import type { StressRow } from "../stress/circuit-result";
import { stressRows } from "../stress/stress-rows";
import type { Player } from "./players";
import { pointResults } from "./point";

/** What one combination of edits comes to, at the operating points. */
export interface Outcome {
  readonly conditions: readonly ConditionResult[];
  readonly stress: readonly StressRow[];
}

/**
 * The base with every combination of the players' edits but none and all, solved and judged, by bit
 * mask. Combinations that come to no readable file are left out. Edits that only judge (a rating, the
 * policy) are judged on the solution that is there. Each combination is solved from the start, as the
 * two sides were: from a neighbour's solution a circuit of two states might come to the other one.
 */
export function outcomesOf(
  base: CircuitFile,
  players: readonly Player[],
): ReadonlyMap<number, Outcome> {
  const whole = (1 << players.length) - 1;
  const moving = players.reduce(
    (mask, player, index) => (player.some((edit) => edit.electrical) ? mask | (1 << index) : mask),
    0,
  );
  const solved = new Map<number, readonly ConditionResult[]>();
  const outcomes = new Map<number, Outcome>();
  for (let subset = 1; subset < whole; subset++) {
    const circuit = readCircuitFile(fileWith(base, players, subset));
    if (!circuit.ok) continue;
    const conditions = solved.get(subset & moving) ?? pointResults(circuit.value);
    solved.set(subset & moving, conditions);
    outcomes.set(subset, { conditions, stress: stressRows(circuit.value, conditions, true) });
  }
  return outcomes;
}

function fileWith(base: CircuitFile, players: readonly Player[], subset: number): CircuitFile {
  return players
    .filter((_, index) => (subset & (1 << index)) !== 0)
    .flat()
    .reduce((file, edit) => edit.apply(file), base);
}
