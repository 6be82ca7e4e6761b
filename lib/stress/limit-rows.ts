import type { Limit } from "../circuit/limit";
import type { Circuit } from "../kinds/circuit";
import type { ConditionResult, Extreme } from "../mna/solution";
import type { Verdict } from "../values/verdict";
import type { LimitRow } from "./circuit-result";

/** Every limit in every condition it holds in. Where the condition is not solved the verdict is unknown. */
export function limitRows(
  circuit: Circuit,
  results: readonly ConditionResult[],
): readonly LimitRow[] {
  return circuit.limits.flatMap((limit) =>
    results
      .filter((result) => limit.condition === null || limit.condition === result.name)
      .map((result) => limitRow(limit, result)),
  );
}

function limitRow(limit: Limit, result: ConditionResult): LimitRow {
  const range = result.status === "solved" ? rangeOf(limit, result) : null;
  return {
    ...limit.of,
    condition: result.name,
    min: limit.min,
    max: limit.max,
    low: range?.low ?? null,
    high: range?.high ?? null,
    verdict: verdictOf(limit, range),
  };
}

interface Span {
  readonly low: number;
  readonly high: number;
}

function verdictOf(limit: Limit, range: Span | null): Verdict {
  if (range === null) return "unknown";
  // Written so that NaN fails.
  const under = limit.max === null || range.high <= limit.max;
  const over = limit.min === null || range.low >= limit.min;
  return under && over ? "pass" : "fail";
}

/** The extremes that count: of the spread, of a sweep or a transient, else the operating point. */
function rangeOf(limit: Limit, result: ConditionResult): Span | null {
  if ("net" in limit.of) return netRange(limit.of.net, result);
  if ("between" in limit.of) {
    const [plus, minus] = limit.of.between;
    return differenceRange(plus, minus, result);
  }
  const course = (result.transient ?? result.sweep)?.extremes[limit.of.part]?.[limit.of.quantity];
  if (course !== undefined) return spanOf(course);
  const part = result.parts[limit.of.part];
  const value =
    limit.of.quantity === "power"
      ? part?.power
      : limit.of.quantity === "voltage"
        ? part?.voltage
        : limit.of.quantity === "temperature"
          ? part?.temperature
          : Object.values(part?.currents ?? {})[0];
  return value === null || value === undefined ? null : { low: value, high: value };
}

function netRange(net: string, result: ConditionResult): Span | null {
  const course = (result.transient ?? result.sweep)?.netExtremes[net];
  if (course !== undefined) return spanOf(course);
  const spread = result.spread?.nets[net];
  if (spread !== undefined) return { low: spread.low, high: spread.high };
  const value = result.nets[net];
  return value === null || value === undefined ? null : { low: value, high: value };
}

function differenceRange(plus: string, minus: string, result: ConditionResult): Span | null {
  const course = result.transient ?? result.sweep;
  const first = course?.nets[plus];
  const second = course?.nets[minus];
  if (first !== undefined && second !== undefined) {
    const differences = first.map((value, k) => (value ?? Number.NaN) - (second[k] ?? Number.NaN));
    return { low: Math.min(...differences), high: Math.max(...differences) };
  }
  const a = result.nets[plus];
  const b = result.nets[minus];
  if (a === null || a === undefined || b === null || b === undefined) return null;
  return { low: a - b, high: a - b };
}

function spanOf(extreme: Extreme): Span {
  return { low: extreme.min, high: extreme.max };
}
