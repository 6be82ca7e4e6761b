import { errorBound } from "../numerics/skeel-condition";
import { pivotRatio } from "../numerics/solve";
import type { Found } from "./continuations";
import type { Certificate } from "./solution";
import type { System } from "./system";

/** What a solution must reach to be one. */
const certificateLimits = {
  kclResidual: 1e-6,
  powerBalance: 1e-6,
  errorBound: 1e-3,
} as const;

/** A: currents below are not measured against less. */
const LEAST_CURRENT = 1e-12;

/** W: a circuit at rest has rounding for power, and no balance to show. */
const LEAST_POWER = 1e-15;

/**
 * What an operating point was held to: Kirchhoff's current law at every net, Tellegen's theorem over all
 * parts, and an estimate of the rounding error by Skeel's condition, which the last step of `newton`, a
 * refinement, makes valid. The system must have been assembled at `x`.
 * @param charging rates of charge by terminal, A, all laws one after the other; null: none
 */
export function certify(
  system: System,
  x: Float64Array,
  found: Found,
  charging: Float64Array | null = null,
): Certificate {
  const { sums, largest } = currentsAtNets(system, charging);
  let kclResidual = 0;
  for (let node = 0; node < sums.length; node++) {
    const relative = Math.abs(sums[node] ?? 0) / Math.max(LEAST_CURRENT, largest[node] ?? 0);
    // Written so that NaN counts as the largest.
    if (!(relative <= kclResidual)) kclResidual = relative;
  }
  return {
    kclResidual,
    powerBalance: powerBalance(system, x, charging),
    errorBound: errorBound(system.matrix, found.factor, x.subarray(1)),
    pivotRatio: pivotRatio(found.factor),
    iterations: found.iterations,
    method: found.method,
  };
}

/** Whether the solution may be published. Written so that NaN is refused. */
export function holds(certificate: Certificate): boolean {
  return (
    certificate.kclResidual <= certificateLimits.kclResidual &&
    certificate.powerBalance <= certificateLimits.powerBalance &&
    certificate.errorBound <= certificateLimits.errorBound
  );
}

/** The node unknown whose currents add up worst. */
export function worstNode(system: System): number {
  const { sums, largest } = currentsAtNets(system, null);
  let [worst, most] = [0, -1];
  for (const node of system.network.unknowns.nodes) {
    const relative = Math.abs(sums[node] ?? 0) / Math.max(LEAST_CURRENT, largest[node] ?? 0);
    if (!(relative <= most)) [worst, most] = [node, relative];
  }
  return worst;
}

function currentsAtNets(
  system: System,
  charging: Float64Array | null,
): { sums: Float64Array; largest: Float64Array } {
  const sums = new Float64Array(system.size + 1);
  const largest = new Float64Array(system.size + 1);
  let offset = 0;
  for (const { law, pins } of system.network.parts) {
    for (let t = 0; t < law.terminals.length; t++) {
      const terminal = law.terminals[t] ?? 0;
      // Rows of a part's own are no nets; the reference also takes what returns there.
      if (t >= pins.length && terminal !== 0) continue;
      const current = (law.f[t] ?? 0) + (charging?.[offset + t] ?? 0);
      sums[terminal] = (sums[terminal] ?? 0) + current;
      largest[terminal] = Math.max(largest[terminal] ?? 0, Math.abs(current));
    }
    offset += law.terminals.length;
  }
  return { sums, largest };
}

function powerBalance(system: System, x: Float64Array, charging: Float64Array | null): number {
  let offset = 0;
  let sum = 0;
  let size = 0;
  for (const { law, pins } of system.network.parts) {
    let power = 0;
    for (let t = 0; t < pins.length; t++)
      power += (x[law.terminals[t] ?? 0] ?? 0) * ((law.f[t] ?? 0) + (charging?.[offset + t] ?? 0));
    offset += law.terminals.length;
    sum += power;
    size += Math.abs(power);
  }
  return Math.abs(sum) / Math.max(LEAST_POWER, size);
}
