import type { CircuitResult } from "../stress/circuit-result";
import { limitMargin } from "./limit-words";
import type { Anchor, Finding } from "./review-state";

/** Where a finding stands, in words: `net TREF`, `part Q1`. */
export function anchorWords(anchor: Anchor): string {
  if ("net" in anchor) return `net ${anchor.net}`;
  if ("part" in anchor) return `part ${anchor.part}`;
  if ("condition" in anchor) return `condition ${anchor.condition}`;
  return `limit ${anchor.limit}`;
}

/** A finding's number as the given result has it: the same quantity in the same condition. */
export interface NumberNow {
  readonly value: number;
  readonly past: boolean;
}

/** What the number a finding was written about is in this result; null where it cannot be said. */
export function numberNow(finding: Finding, result: CircuitResult | null): NumberNow | null {
  const { was, anchor } = finding;
  if (was === null || result === null) return null;
  if ("net" in anchor) {
    const value = result.conditions.find((one) => one.name === was.condition)?.nets[anchor.net];
    if (value === null || value === undefined) return null;
    const limit = result.limits.find(
      (row) => row.net === anchor.net && row.condition === was.condition,
    );
    return { value, past: limit !== undefined && (limitMargin(limit) ?? -1) < 0 };
  }
  if ("part" in anchor) {
    const row = result.stress.find(
      (one) =>
        one.part === anchor.part &&
        one.quantity === was.quantity &&
        one.condition === was.condition,
    );
    return row?.applied == null ? null : { value: row.applied, past: row.verdict === "fail" };
  }
  return null;
}
