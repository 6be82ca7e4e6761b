import { digest } from "../circuit/digest";
import { engineVersion } from "../mna/engine-version";

/** Address of the run that solves a circuit: by what it is computed from. */
export function solveAddress(circuitDigest: string): string {
  return digest({ kind: "solve", circuit: circuitDigest, engine: engineVersion });
}

/** Address of the run that compares a circuit with its base; null: a first issue. */
export function compareAddress(circuitDigest: string, baseDigest: string | null): string {
  return digest({
    kind: "compare",
    circuit: circuitDigest,
    base: baseDigest,
    engine: engineVersion,
  });
}
