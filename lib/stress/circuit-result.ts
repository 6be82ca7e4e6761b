import type { ConditionResult, SolveProblem } from "../mna/solution";
import type { Verdict } from "../values/verdict";

/** Where a rule comes from; printed beside every verdict. */
export interface RuleCitation {
  readonly policy: string;
  readonly id: string;
  readonly document: string;
  readonly clause: string;
  readonly status: string;
}

/** One part judged by one rule, at the condition with the least margin (or in each condition). */
export interface StressRow {
  readonly part: string;
  readonly quantity: string;
  readonly condition: string;
  readonly applied: number | null;
  readonly rated: number | null;
  readonly limit: number | null;
  /** applied / rated */
  readonly ratio: number | null;
  /** limit / applied - 1; null where it cannot be said or nothing is applied */
  readonly margin: number | null;
  readonly verdict: Verdict;
  readonly rule: RuleCitation;
  /** What is missing where the verdict is unknown, in words: `rating power`, `style`, … */
  readonly needs?: readonly string[];
}

/** One limit in one condition. `low` and `high` are the extremes that count there. */
export interface LimitRow {
  readonly net?: string;
  readonly between?: readonly [string, string];
  readonly part?: string;
  readonly quantity?: string;
  readonly condition: string;
  readonly min: number | null;
  readonly max: number | null;
  readonly low: number | null;
  readonly high: number | null;
  readonly verdict: Verdict;
}

/** What `solve` prints and what a solver run stores. */
export interface CircuitResult {
  readonly ampersignResult: 1;
  readonly digest: string;
  readonly electricalDigest: string;
  readonly engine: string;
  readonly reference: string;
  readonly unknowns: number;
  readonly conditions: readonly ConditionResult[];
  readonly stress: readonly StressRow[];
  readonly limits: readonly LimitRow[];
  readonly problems: readonly SolveProblem[];
}
