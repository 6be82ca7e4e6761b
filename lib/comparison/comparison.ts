import type { Verdict } from "../values/verdict";

export type ChangeKind =
  | "value"
  | "rating"
  | "connection"
  | "added"
  | "removed"
  | "renumbered"
  | "renamed"
  | "moved";

/** One edit between two revisions; `was` and `is` as written in the files. */
export interface Edit {
  readonly id: string;
  readonly change: ChangeKind;
  readonly part?: string;
  readonly net?: string;
  readonly condition?: string;
  readonly limit?: string;
  readonly policy?: string;
  /** The parameter's name, `pins.2` for a connection, `ratings.power` for a rating. */
  readonly key?: string;
  readonly was?: unknown;
  readonly is?: unknown;
}

/** A net whose voltage moved by more than solver error, in one condition. */
export interface NetShift {
  readonly net: string;
  readonly condition: string;
  readonly was: number | null;
  readonly is: number | null;
  /** is - was, V */
  readonly shift: number | null;
  /** What the base's tolerances allow, V. */
  readonly band: readonly [low: number, high: number] | null;
  /** `is` lies outside the band. */
  readonly significant: boolean;
  /** Limits that the shift crosses, in words of the limit. */
  readonly crosses: readonly string[];
}

/** A margin before and after. */
export interface StressShift {
  readonly part: string;
  readonly quantity: string;
  readonly rule: string;
  readonly condition: string;
  readonly was: number | null;
  readonly is: number | null;
  readonly verdictWas: Verdict | null;
  readonly verdictIs: Verdict | null;
}

/** The fair share of one edit in one shift (Shapley value over orders of applying the edits). */
export interface Cause {
  readonly edit: string;
  readonly net?: string;
  readonly part?: string;
  readonly quantity: string;
  /** Of a margin: the rule it is under. */
  readonly rule?: string;
  readonly condition: string;
  readonly share: number;
}

export interface ComparisonProblem {
  readonly code: string;
  readonly message: string;
}

/** What `compare` prints and what a comparison run stores. */
export interface Comparison {
  readonly ampersignComparison: 1;
  readonly base: string;
  readonly proposed: string;
  readonly edits: readonly Edit[];
  readonly nets: readonly NetShift[];
  readonly stress: readonly StressShift[];
  readonly causes: readonly Cause[];
  readonly problems: readonly ComparisonProblem[];
}
