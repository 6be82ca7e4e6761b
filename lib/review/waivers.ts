import type { CircuitResult, LimitRow, StressRow } from "../stress/circuit-result";
import { limitMargin, limitSubject } from "./limit-words";
import type { Decision, WaiverSubject } from "./review-state";

export type Waiver = Extract<Decision, { kind: "waiver" }>;

/** Whether a waiver still covers its number in a revision. */
export type WaiverStanding =
  | { readonly kind: "stands" }
  /** Its number has become worse than the one that was waived. */
  | { readonly kind: "lapsed"; readonly was: number | null; readonly is: number | null }
  | { readonly kind: "withdrawn" }
  /** There is nothing to waive: the number is inside, or its subject is gone. */
  | { readonly kind: "notNeeded" };

/** Margins are read to half a per cent; a number that is worse by less has got no worse. */
const READING = 0.005;

/** The waivers that were granted and not withdrawn. */
export function grantedWaivers(decisions: readonly Decision[]): readonly Waiver[] {
  const withdrawn = withdrawnNumbers(decisions);
  return decisions.filter(
    (decision): decision is Waiver => decision.kind === "waiver" && !withdrawn.has(decision.number),
  );
}

/** How a waiver stands in a result: it is carried from revision to revision while its number gets no worse. */
export function waiverStanding(
  waiver: Waiver,
  decisions: readonly Decision[],
  result: CircuitResult,
): WaiverStanding {
  if (withdrawnNumbers(decisions).has(waiver.number)) return { kind: "withdrawn" };
  const row = subjectRow(waiver.subject, result);
  if (row === null || row.verdict === "pass") return { kind: "notNeeded" };
  const is = "rule" in row ? row.margin : limitMargin(row);
  return covers(waiver, is) ? { kind: "stands" } : { kind: "lapsed", was: waiver.margin, is };
}

/** The number of the waiver that a failing or unknown stress row stands under; null where none covers it. */
export function waiverOfRow(row: StressRow, waivers: readonly Waiver[]): string | null {
  const found = waivers.find(
    (waiver) =>
      "part" in waiver.subject &&
      waiver.subject.part === row.part &&
      waiver.subject.rule === row.rule.id &&
      waiver.subject.condition === row.condition &&
      covers(waiver, row.margin),
  );
  return row.verdict === "pass" ? null : (found?.number ?? null);
}

/** The number of the waiver that a limit which is not met stands under; null where none covers it. */
export function waiverOfLimit(row: LimitRow, waivers: readonly Waiver[]): string | null {
  const subject = limitSubject(row);
  const found = waivers.find(
    (waiver) =>
      "limit" in waiver.subject &&
      waiver.subject.limit === subject &&
      waiver.subject.condition === row.condition &&
      covers(waiver, limitMargin(row)),
  );
  return row.verdict === "pass" ? null : (found?.number ?? null);
}

/** An unknown that was waived stays waived while it is unknown; a number, while it is no worse. */
function covers(waiver: Waiver, margin: number | null): boolean {
  if (waiver.margin === null) return margin === null;
  return margin !== null && margin >= waiver.margin - READING;
}

function subjectRow(subject: WaiverSubject, result: CircuitResult): StressRow | LimitRow | null {
  if ("limit" in subject)
    return (
      result.limits.find(
        (row) => row.condition === subject.condition && limitSubject(row) === subject.limit,
      ) ?? null
    );
  return (
    result.stress.find(
      (row) =>
        row.part === subject.part &&
        row.rule.id === subject.rule &&
        row.condition === subject.condition,
    ) ?? null
  );
}

function withdrawnNumbers(decisions: readonly Decision[]): ReadonlySet<string> {
  return new Set(
    decisions.flatMap((decision) => (decision.kind === "withdrawal" ? [decision.waiver] : [])),
  );
}
