import type { CircuitResult } from "../stress/circuit-result";
import { limitMargin, limitSubject } from "./limit-words";

/** One margin of one condition: a graduation of the condition ruler. */
export interface ConditionMargin {
  readonly margin: number;
  readonly subject:
    | { readonly part: string; readonly quantity: string; readonly rule: string }
    | { readonly limit: string };
  /** It is over, but stands under a waiver. */
  readonly waived: boolean;
}

/** Says whether a stress row or a limit stands under a waiver. */
export type IsWaived = (
  subject: ConditionMargin["subject"] & { readonly condition: string },
) => boolean;

/** The margins of a condition, least first: every stress row judged in it and every limit that holds in it. */
export function conditionMargins(
  result: CircuitResult,
  condition: string,
  isWaived: IsWaived,
): readonly ConditionMargin[] {
  const stress = result.stress
    .filter((row) => row.condition === condition && row.margin !== null)
    .map((row) => ({
      margin: row.margin ?? Number.NaN,
      subject: { part: row.part, quantity: row.quantity, rule: row.rule.id },
    }));
  const limits = result.limits
    .filter((row) => row.condition === condition)
    .map((row) => ({
      margin: limitMargin(row) ?? Number.NaN,
      subject: { limit: limitSubject(row) },
    }));
  return [...stress, ...limits]
    .filter((entry) => Number.isFinite(entry.margin))
    .map((entry) => ({
      ...entry,
      waived: entry.margin < 0 && isWaived({ ...entry.subject, condition }),
    }))
    .sort((a, b) => a.margin - b.margin);
}

/** The margin that a ruler stop names: the least that no waiver covers. */
export function leastMargin(margins: readonly ConditionMargin[]): ConditionMargin | null {
  return margins.find((entry) => !entry.waived) ?? margins[0] ?? null;
}
