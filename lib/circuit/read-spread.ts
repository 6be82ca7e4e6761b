import type { Spread } from "./analysis";
import type { Place } from "./place";

const METHODS = ["extremeValue", "rootSumSquare", "monteCarlo"] as const;
const DISTRIBUTIONS = ["uniform", "normal"] as const;
const DEFAULT_SAMPLES = 1000;
const DEFAULT_SEED = 1;
const MOST_SAMPLES = 1_000_000;

/** Reads how the tolerances are spread over the results. */
export function readSpread(place: Place): Spread | null {
  const fields = place.fields(["method", "samples", "seed", "distribution"]);
  if (fields === null) return null;
  const method = fields.required("method")?.choice(METHODS) ?? null;
  const samples = fields.optional("samples")?.count(1, MOST_SAMPLES);
  const seed = fields.optional("seed")?.count(0, Number.MAX_SAFE_INTEGER);
  const distribution = fields.optional("distribution")?.choice(DISTRIBUTIONS);
  if (method === null) return null;
  return {
    method,
    samples: samples ?? DEFAULT_SAMPLES,
    seed: seed ?? DEFAULT_SEED,
    distribution: distribution ?? "uniform",
  };
}
