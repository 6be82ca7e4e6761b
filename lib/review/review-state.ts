import type { Comparison } from "../comparison/comparison";
import type { CircuitResult } from "../stress/circuit-result";

export type Role = "designer" | "reviewer" | "approver" | "observer";
export type Severity = "major" | "minor" | "observation" | "question";

/** What a finding is about: a net or part of the flattened circuit, a condition, or a limit (its words). */
export type Anchor =
  | { readonly net: string }
  | { readonly part: string }
  | { readonly condition: string }
  | { readonly limit: string };

/** The number a finding was written about. */
export interface Was {
  /** `voltage`, `margin`, `junctionTemperature`, … */
  readonly quantity: string;
  readonly condition: string;
  readonly value: number;
  readonly unit: string;
  readonly revision: string;
}

export interface Remark {
  readonly id: string;
  readonly author: string;
  readonly at: string;
  readonly text: string;
}

/** Words, from the shared document. Immutable but for appended remarks. */
export interface Finding {
  readonly id: string;
  /** Running number in the design, by time raised; settled by the first release that knows it. */
  readonly number: number;
  readonly anchor: Anchor;
  readonly severity: Severity;
  readonly text: string;
  readonly author: string;
  /** ISO 8601, UTC */
  readonly at: string;
  /** Letter of the revision it was raised on. */
  readonly revision: string;
  readonly was: Was | null;
  readonly remarks: readonly Remark[];
}

/** Decisions: rows that only the server writes, and every one sees live. `user` is a user id, `at` ISO 8601 UTC. */
export type Decision =
  | (DecisionBody & { readonly kind: "check"; readonly revision: string; readonly item: string })
  | (DecisionBody & { readonly kind: "uncheck"; readonly revision: string; readonly item: string })
  | (DecisionBody & { readonly kind: "closure"; readonly finding: string; readonly reason: string })
  | (DecisionBody & {
      readonly kind: "reopening";
      readonly finding: string;
      readonly reason: string;
    })
  | (DecisionBody & {
      readonly kind: "waiver";
      /** `W-1`, running in the design. */
      readonly number: string;
      readonly revision: string;
      readonly subject: WaiverSubject;
      readonly reason: string;
      /** The margin that was waived (limit / applied - 1), null where unknown was waived. It lapses when a later margin is worse. */
      readonly margin: number | null;
    })
  | (DecisionBody & {
      readonly kind: "withdrawal";
      readonly waiver: string;
      readonly reason: string;
    })
  | (DecisionBody & {
      readonly kind: "signature";
      readonly revision: string;
      readonly meaning: "authored" | "reviewed" | "approved";
      /** What the signature is bound to (see `lib/record`). */
      readonly boundDigest: string;
      readonly method: string;
      readonly name: string;
    })
  | (DecisionBody & {
      readonly kind: "release";
      readonly revision: string;
      /** The findings as they stood stored at the release: what comes later, whatever its date, is none of it; their numbers are settled. */
      readonly findings: readonly Finding[];
    })
  | (DecisionBody & {
      readonly kind: "return";
      readonly revision: string;
      readonly reason: string;
    });

interface DecisionBody {
  readonly id: string;
  readonly user: string;
  readonly at: string;
}

/** A stress row (part, rule, condition) or a limit (its words, condition) that may be waived. */
export type WaiverSubject =
  | { readonly part: string; readonly rule: string; readonly condition: string }
  | { readonly limit: string; readonly condition: string };

/** All that the exit criteria of one revision are computed from. */
export interface ReviewState {
  /** Letter under review. */
  readonly revision: string;
  /** Users who authored the revision. */
  readonly authors: readonly string[];
  readonly approvers: readonly string[];
  /** null until the worker has solved it. */
  readonly result: CircuitResult | null;
  /** null until compared; of a first issue, a comparison against nothing: every part is an added item. */
  readonly comparison: Comparison | null;
  readonly findings: readonly Finding[];
  readonly decisions: readonly Decision[];
  /** Letters of later revisions of the design under review. */
  readonly newerUnderReview: readonly string[];
}
