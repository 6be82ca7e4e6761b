import type { Analysis, Spread } from "../circuit/analysis";
import type { Limit } from "../circuit/limit";
import type { Part } from "./part";

/** An operating condition, with its overrides applied to the parts. */
export interface Condition {
  readonly name: string;
  /** degrees Celsius */
  readonly ambient: number;
  readonly selfHeating: boolean;
  readonly analysis: Analysis;
  /** Node voltages where the search begins. */
  readonly start: Readonly<Record<string, number>>;
  readonly spread: Spread | null;
  /** The fitted parts as this condition sets them, in the order of `Circuit.parts`. */
  readonly parts: readonly Part[];
  /** What the file's `set` says, as written: for display and comparison. */
  readonly set: Readonly<Record<string, unknown>>;
}

/** A rule of the file's own policy, as written there; `stress` reads it. */
export interface PolicyChoice {
  readonly use: string;
  readonly variant: unknown;
  readonly rules: readonly unknown[];
}

/** A circuit file, read and flattened. Everything downstream works on this. */
export interface Circuit {
  readonly title: string;
  /** The net held at 0 V, after the fallback rule. */
  readonly reference: string;
  /** Nets touched by a fitted part, reference included, in code-point order. */
  readonly nets: readonly string[];
  /** Fitted parts with the file's own parameters, in file order. */
  readonly parts: readonly Part[];
  readonly conditions: readonly Condition[];
  readonly limits: readonly Limit[];
  readonly policy: PolicyChoice;
  /** `sha256:…` over the RFC 8785 form of the whole file. */
  readonly digest: string;
  /** The same without title, notes, ids and drawing, values read. */
  readonly electricalDigest: string;
}
