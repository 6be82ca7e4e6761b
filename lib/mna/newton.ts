import type { Factor } from "../numerics/factor";
import { solve } from "../numerics/solve";
import { fail, ok, type Result } from "../values/result";
import type { SingularAt, System } from "./system";

/** Newton's steps did not settle. `unknown`: the one that moved most in the last step. */
export interface NotConverged {
  readonly kind: "noConvergence";
  readonly iterations: number;
  readonly unknown: number;
}

export type NoSolution = SingularAt | NotConverged;

/** Where Newton's steps ended: `x` is changed in place; this is the rest. */
export interface Converged {
  readonly iterations: number;
  readonly factor: Factor;
}

export interface NewtonOptions {
  readonly mostIterations: number;
  /** Largest change of a node voltage in one step, V; Infinity: full steps. */
  readonly largestStep: number;
}

export const plainNewton: NewtonOptions = {
  mostIterations: 60,
  largestStep: Number.POSITIVE_INFINITY,
};

/** A step below this part of an unknown's size, or below the absolute one (V or A), is none. */
const RELATIVE = 1e-9;
const ABSOLUTE = 1e-12;
/** A step below this that no longer shrinks is rounding. */
const ROUNDING = 1e-6;
const MOST_WITHOUT_GAIN = 4;

/**
 * Newton's method on f(x) + rate q(x) + history = 0. It ends when the last step was none and no law was
 * limited, with one step more that works as a refinement: the residual is computed by the laws themselves.
 */
export function newton(
  system: System,
  x: Float64Array,
  options: NewtonOptions,
): Result<Converged, NoSolution> {
  const n = system.size;
  const b = new Float64Array(n);
  let least = Number.POSITIVE_INFINITY;
  let withoutGain = 0;
  let worst = 0;
  for (let iteration = 1; iteration <= options.mostIterations; iteration++) {
    system.assemble(x);
    residual(system, b);
    const factored = system.factorised();
    if (!factored.ok) return factored;
    const step = solve(factored.value, b);
    const scale =
      options.largestStep === Number.POSITIVE_INFINITY ? 1 : damping(system, step, options);
    let size = 0;
    for (let k = 0; k < n; k++) {
      const change = (step[k] ?? 0) * scale;
      const next = (x[k + 1] ?? 0) + change;
      x[k + 1] = next;
      const relative = Math.abs(change) / (ABSOLUTE + RELATIVE * Math.abs(next));
      // Written so that NaN counts as the largest.
      if (!(relative <= size)) {
        size = relative;
        worst = k + 1;
      }
    }
    if (Number.isNaN(size)) break;
    const followed = system.stage.limited === 0 && scale === 1;
    withoutGain = size < least / 2 ? 0 : withoutGain + 1;
    least = Math.min(least, size);
    const rounding = withoutGain >= MOST_WITHOUT_GAIN && size * RELATIVE < ROUNDING;
    if (followed && (size <= 1 || rounding))
      return ok({ iterations: iteration, factor: factored.value });
  }
  return fail({ kind: "noConvergence", iterations: options.mostIterations, unknown: worst });
}

function residual(system: System, b: Float64Array): void {
  const { f, q, rate, history } = system;
  for (let k = 0; k < b.length; k++)
    b[k] = -((f[k + 1] ?? 0) + rate * (q[k + 1] ?? 0) + (history[k + 1] ?? 0));
}

function damping(system: System, step: Float64Array, options: NewtonOptions): number {
  let largest = 0;
  for (const node of system.network.unknowns.nodes)
    largest = Math.max(largest, Math.abs(step[node - 1] ?? 0));
  return largest > options.largestStep ? options.largestStep / largest : 1;
}
