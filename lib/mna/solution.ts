/**
 * The result of solving: the shapes that `solve` prints, that a job stores and that pages read.
 * Plain JSON: voltages in V, currents in A counted into the part, powers in W absorbed by the part,
 * temperatures in degrees Celsius, times in s. `null` stands where nothing determines a number.
 */

/** A failure of one condition, with the nets and parts to blame. */
export interface SolveProblem {
  readonly code: SolveProblemCode;
  readonly message: string;
  readonly condition: string;
  readonly nets: readonly string[];
  readonly parts: readonly string[];
}

export type SolveProblemCode =
  | "noPathToReference"
  | "sourcesFight"
  | "currentHasNowhereToGo"
  | "singular"
  | "noConvergence"
  | "notTrusted"
  | "tooLarge"
  | "stepTooSmall"
  | "notYetSolved";

/** The proof that stands beside every solution; limits in `certificate.ts`. */
export interface Certificate {
  /** Largest |sum of currents| at a net over the largest |current| there. */
  readonly kclResidual: number;
  /** |sum of absorbed powers| over the sum of |powers| (Tellegen). */
  readonly powerBalance: number;
  /** Unit roundoff times Skeel's condition: a relative bound on the unknowns. */
  readonly errorBound: number;
  /** Information only. */
  readonly pivotRatio: number;
  readonly iterations: number;
  /** `direct`, `newton`, or the continuation that was needed. */
  readonly method: string;
}

export interface PartResult {
  /** First pin minus second pin. */
  readonly voltage: number | null;
  readonly power: number | null;
  readonly currents: Readonly<Record<string, number | null>>;
  readonly temperature: number;
}

/** Extremes of one quantity over a sweep or a transient, and where they stand. */
export interface Extreme {
  readonly min: number;
  readonly max: number;
  readonly rms: number;
  readonly atMin: number;
  readonly atMax: number;
}

export interface TransientResult {
  readonly time: readonly number[];
  readonly nets: Readonly<Record<string, readonly number[]>>;
  /** By part, then by rated quantity (`power`, `reverseVoltage`, …) of `kinds/stressed-quantities.ts`. */
  readonly extremes: Readonly<Record<string, Readonly<Record<string, Extreme>>>>;
  /** By net: extremes of the node voltage, so that limits need no stored points. */
  readonly netExtremes: Readonly<Record<string, Extreme>>;
}

export interface SweepResult {
  readonly values: readonly number[];
  readonly nets: Readonly<Record<string, readonly (number | null)[]>>;
  readonly extremes: Readonly<Record<string, Readonly<Record<string, Extreme>>>>;
  readonly netExtremes: Readonly<Record<string, Extreme>>;
}

export interface FrequencyResponseResult {
  readonly frequency: readonly number[];
  readonly nets: Readonly<
    Record<string, { readonly magnitude: readonly number[]; readonly phase: readonly number[] }>
  >;
}

export interface SpreadResult {
  readonly method: string;
  readonly nets: Readonly<
    Record<string, { readonly low: number; readonly nominal: number; readonly high: number }>
  >;
}

export interface ConditionResult {
  readonly name: string;
  readonly status: "solved" | "unsolvable";
  readonly nets: Readonly<Record<string, number | null>>;
  readonly parts: Readonly<Record<string, PartResult>>;
  readonly certificate: Certificate | null;
  readonly sweep: SweepResult | null;
  readonly frequencyResponse: FrequencyResponseResult | null;
  readonly transient: TransientResult | null;
  readonly spread: SpreadResult | null;
}

/** All conditions of one circuit. */
export interface SolvedCircuit {
  readonly reference: string;
  /** Unknowns of the first condition. */
  readonly unknowns: number;
  readonly conditions: readonly ConditionResult[];
  readonly problems: readonly SolveProblem[];
}
