import type { Analysis } from "../../circuit/analysis";
import { findSolution } from "../continuations";
import type { System } from "../system";
import { capture, emptyState, type State } from "./tr-bdf2";

/** Of the whole course: the time in which algebraic unknowns find their values while charges stay. */
export const INSTANT = 1e-10;

/**
 * Lets the unknowns that carry no charge follow a jump while charges and fluxes stay as they are: two
 * backward Euler steps so short that nothing else moves; the second gives the charging currents.
 * @returns false where the equations cannot be solved
 */
export function reinitialise(system: System, state: State, instant: number): boolean {
  const warm = state.x.slice();
  for (let round = 0; round < 2; round++) {
    system.rate = 1 / instant;
    for (let k = 0; k < system.history.length; k++)
      system.history[k] = -system.rate * (state.q[k] ?? 0);
    system.stage.time = state.time;
    const answer = findSolution(system, warm, true);
    if (!answer.ok) return false;
    system.stage.begin = "warm";
    system.assemble(warm);
    const before = state.charge.slice();
    state.x.set(warm);
    capture(system, state);
    for (let k = 0; k < before.length; k++)
      state.charging[k] = system.rate * ((state.charge[k] ?? 0) - (before[k] ?? 0));
  }
  return true;
}

/**
 * The charges and fluxes at t = 0: those of the operating point (or none, from rest), but for what
 * `initial` fixes. The unknowns follow in `reinitialise`.
 */
export function initialState(
  system: System,
  analysis: Extract<Analysis, { type: "transient" }>,
  operatingPoint: Float64Array | null,
): State {
  const state = emptyState(system);
  if (operatingPoint !== null) state.x.set(operatingPoint);
  const fixed = new Map(Object.entries(analysis.initial));
  for (const { part, law, pins } of system.network.parts) {
    const current = fixed.get(`${part.path}.current`);
    if (current !== undefined) state.x[law.terminals[pins.length] ?? 0] = current;
  }
  system.stage.time = 0;
  system.stage.begin = "warm";
  system.assemble(state.x);
  for (const { part, law } of system.network.parts) {
    const voltage = fixed.get(`${part.path}.voltage`);
    if (voltage === undefined || law.hold === undefined) continue;
    law.terminals.forEach((row, t) => {
      system.q[row] = (system.q[row] ?? 0) - (law.q[t] ?? 0);
    });
    law.hold(voltage);
    law.terminals.forEach((row, t) => {
      system.q[row] = (system.q[row] ?? 0) + (law.q[t] ?? 0);
    });
  }
  capture(system, state);
  return state;
}
