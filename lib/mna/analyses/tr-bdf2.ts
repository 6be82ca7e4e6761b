import { solve } from "../../numerics/solve";
import { newton, plainNewton } from "../newton";
import type { System } from "../system";

/** Where the first stage ends: with it both stages have the same matrix. */
export const STAGE = 2 - Math.SQRT2;
/** The principal error of the method: kγ of Bank and others (1985). */
const ERROR = (-3 * STAGE * STAGE + 4 * STAGE - 2) / (12 * (2 - STAGE));
const MOST_ITERATIONS = 25;

/** The state at one time: unknowns, static residuals by row, charges by row and by terminal. */
export interface State {
  time: number;
  readonly x: Float64Array;
  readonly f: Float64Array;
  readonly q: Float64Array;
  /** Charges by terminal, all laws one after the other, and their rates. */
  readonly charge: Float64Array;
  readonly charging: Float64Array;
}

/** A state of a system, empty. */
export function emptyState(system: System): State {
  const terminals = system.network.parts.reduce((sum, { law }) => sum + law.terminals.length, 0);
  return {
    time: 0,
    x: new Float64Array(system.size + 1),
    f: new Float64Array(system.size + 1),
    q: new Float64Array(system.size + 1),
    charge: new Float64Array(terminals),
    charging: new Float64Array(terminals),
  };
}

/** Copies residuals and charges of the system as last assembled into the state. */
export function capture(system: System, state: State): void {
  state.f.set(system.f);
  state.q.set(system.q);
  let offset = 0;
  for (const { law } of system.network.parts) {
    state.charge.set(law.q, offset);
    offset += law.q.length;
  }
}

/**
 * One step of TR-BDF2 (Bank, Coughran, Fichtner, Grosse, Rose and Smith 1985; Hosea and Shampine 1996):
 * trapezoidal rule to the stage, second-order backward differences to the end.
 * @param middle the state at the stage, filled here
 * @param end the state at the end, filled here
 * @param endTime the time at which sources count at the end: just before a corner on it
 * @param weight by unknown, what an error of 1 is; 0: not measured
 * @returns the error over the allowed one; Infinity where the equations could not be solved
 */
export function step(
  system: System,
  start: State,
  middle: State,
  end: State,
  width: number,
  endTime: number,
  weight: (unknown: number) => number,
): number {
  const rate = 2 / (STAGE * width);
  const { history, stage } = system;
  system.rate = rate;
  for (let k = 0; k < history.length; k++)
    history[k] = (start.f[k] ?? 0) - rate * (start.q[k] ?? 0);
  middle.time = start.time + STAGE * width;
  middle.x.set(start.x);
  if (!solved(system, middle, middle.time)) return Number.POSITIVE_INFINITY;

  const byMiddle = 1 / (STAGE * (2 - STAGE));
  const byStart = (1 - STAGE) ** 2 * byMiddle;
  for (let k = 0; k < history.length; k++)
    history[k] = -rate * (byMiddle * (middle.q[k] ?? 0) - byStart * (start.q[k] ?? 0));
  end.time = start.time + width;
  for (let k = 0; k < end.x.length; k++)
    end.x[k] = (start.x[k] ?? 0) + ((middle.x[k] ?? 0) - (start.x[k] ?? 0)) / STAGE;
  if (!solved(system, end, endTime)) return Number.POSITIVE_INFINITY;
  stage.time = end.time;
  for (let k = 0; k < end.charge.length; k++) {
    const before = byMiddle * (middle.charge[k] ?? 0) - byStart * (start.charge[k] ?? 0);
    end.charging[k] = rate * ((end.charge[k] ?? 0) - before);
  }
  return errorOf(system, start, middle, end, width, weight);
}

function solved(system: System, state: State, time: number): boolean {
  system.stage.time = time;
  system.stage.begin = "warm";
  const answer = newton(system, state.x, { ...plainNewton, mostIterations: MOST_ITERATIONS });
  if (!answer.ok) return false;
  system.stage.begin = "warm";
  system.assemble(state.x);
  capture(system, state);
  return true;
}

/** The embedded estimate in charges, taken to the unknowns by the step's own matrix, which damps what is stiff. */
function errorOf(
  system: System,
  start: State,
  middle: State,
  end: State,
  width: number,
  weight: (unknown: number) => number,
): number {
  const { factor } = system.structure;
  if (factor === null) return Number.POSITIVE_INFINITY;
  const scale = system.rate * 2 * ERROR * width;
  const b = new Float64Array(system.size);
  for (let k = 0; k < b.length; k++) {
    const row = k + 1;
    b[k] =
      scale *
      ((start.f[row] ?? 0) / STAGE -
        (middle.f[row] ?? 0) / (STAGE * (1 - STAGE)) +
        (end.f[row] ?? 0) / (1 - STAGE));
  }
  const error = solve(factor, b);
  let worst = 0;
  for (let k = 0; k < error.length; k++) {
    const allowed = weight(k + 1);
    if (allowed === 0) continue;
    const relative = Math.abs(error[k] ?? 0) / allowed;
    if (!(relative <= worst)) worst = relative;
  }
  return Number.isNaN(worst) ? Number.POSITIVE_INFINITY : worst;
}
