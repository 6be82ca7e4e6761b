import type { Limit } from "../circuit/limit";
import type { Circuit, Condition } from "../kinds/circuit";
import type { Part } from "../kinds/part";
import type { ConditionResult, Extreme } from "../mna/solution";
import type { Verdict } from "../values/verdict";
import { appliedQuantities, partCourses } from "./applied";
import type { LimitRow } from "./circuit-result";

/** Every limit in every condition it holds in. Where the condition is not solved the verdict is unknown. */
export function limitRows(
  circuit: Circuit,
  results: readonly ConditionResult[],
): readonly LimitRow[] {
  return circuit.limits.flatMap((limit) =>
    results
      .filter((result) => limit.condition === null || limit.condition === result.name)
      .map((result) => limitRow(circuit, limit, result)),
  );
}

function limitRow(circuit: Circuit, limit: Limit, result: ConditionResult): LimitRow {
  const range = result.status === "solved" ? rangeOf(circuit, limit, result) : null;
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
function rangeOf(circuit: Circuit, limit: Limit, result: ConditionResult): Span | null {
  if ("net" in limit.of) return netRange(limit.of.net, result);
  if ("between" in limit.of) {
    const [plus, minus] = limit.of.between;
    return differenceRange(plus, minus, result);
  }
  const { part: path, quantity } = limit.of;
  const condition = circuit.conditions.find((one) => one.name === result.name);
  const part = condition?.parts.find((one) => one.path === path);
  if (condition === undefined || part === undefined) return null;
  const course = partCourses(part, condition, result).find(([name]) => name === quantity);
  if (course !== undefined) return spanOf(course[1]);
  const value = partValue(part, quantity, condition, result);
  return value === null ? null : { low: value, high: value };
}

/** A quantity of a part at the operating point: signed as results print it, else as derating rules see it. */
function partValue(
  part: Part,
  quantity: string,
  condition: Condition,
  result: ConditionResult,
): number | null {
  const solved = result.parts[part.path];
  if (solved === undefined) return null;
  if (quantity === "power" || quantity === "voltage" || quantity === "temperature")
    return solved[quantity];
  if (quantity === "current") return Object.values(solved.currents)[0] ?? null;
  return appliedQuantities(part, condition, result)?.steady[quantity] ?? null;
}

function netRange(net: string, result: ConditionResult): Span | null {
  const course = (result.transient ?? result.sweep)?.netExtremes[net];
  if (course !== undefined) return spanOf(course);
  const spread = result.spread?.nets[net];
  if (spread !== undefined) return { low: spread.low, high: spread.high };
  const value = result.nets[net];
  return value === null || value === undefined ? null : { low: value, high: value };
}

/** Over a course, the difference of what is stored; where a net is not, only against one that stands still can it be said. */
function differenceRange(plus: string, minus: string, result: ConditionResult): Span | null {
  const course = result.transient ?? result.sweep;
  if (course === null) {
    const a = result.nets[plus];
    const b = result.nets[minus];
    if (a === null || a === undefined || b === null || b === undefined) return null;
    return { low: a - b, high: a - b };
  }
  const first = course.nets[plus];
  const second = course.nets[minus];
  if (first !== undefined && second !== undefined) {
    let low = Number.POSITIVE_INFINITY;
    let high = Number.NEGATIVE_INFINITY;
    for (const [k, value] of first.entries()) {
      const other = second[k];
      if (value === null || other === null || other === undefined) return null;
      low = Math.min(low, value - other);
      high = Math.max(high, value - other);
    }
    return { low, high };
  }
  const a = course.netExtremes[plus];
  const b = course.netExtremes[minus];
  if (a === undefined || b === undefined) return null;
  const still = a.min === a.max || b.min === b.max;
  return still ? { low: a.min - b.max, high: a.max - b.min } : null;
}

function spanOf(extreme: Extreme): Span {
  return { low: extreme.min, high: extreme.max };
}
