import { joinPart } from "./assemble-part";
import { catalogue } from "./catalogue";
import type { Part } from "./part";

/** A parameter that its tolerance and drift let vary, between two factors of its nominal value. */
export interface VaryingParameter {
  readonly name: string;
  readonly low: number;
  readonly high: number;
}

/**
 * What tolerances and end-of-life drift let vary in a part. `params.tolerance` and the drift serve the
 * kind's first parameter: low = 1 + bias - (tolerance + random), high likewise with plus.
 */
export function varyingParameters(part: Part): readonly VaryingParameter[] {
  const [first] = Object.keys(catalogue[part.kind].parameters);
  const own = "tolerance" in part.params ? part.params.tolerance : 0;
  const widths = new Map(Object.entries(part.tolerances));
  if (first !== undefined && own > 0) widths.set(first, own);
  const bias = part.drift?.bias ?? 0;
  const random = part.drift?.random ?? 0;
  if (first !== undefined && (bias !== 0 || random !== 0))
    widths.set(first, widths.get(first) ?? 0);
  return [...widths].map(([name, width]) => {
    const drifts = name === first;
    const middle = 1 + (drifts ? bias : 0);
    const half = width + (drifts ? random : 0);
    return { name, low: middle - half, high: middle + half };
  });
}

/** The part with one numeric parameter multiplied; another kind of parameter stays. */
export function scaledPart(part: Part, name: string, factor: number): Part {
  const value = new Map<string, unknown>(Object.entries(part.params)).get(name);
  if (typeof value !== "number") return part;
  return joinPart(part.kind, part, { ...part.params, [name]: value * factor });
}
