import type { Kind } from "../kinds/part";

/** What a rule's limit is made of; the forms of the derating reference. Temperatures in degrees Celsius. */
export type LimitForm =
  /** rating x f(T), f piecewise linear through the points, held before the first. */
  | {
      readonly form: "ratio";
      readonly rating: string;
      readonly points: readonly (readonly [celsius: number, factor: number])[];
      readonly beyond: "zero" | "notEvaluated" | "held";
    }
  /** A fixed value, or another applied quantity. */
  | { readonly form: "ceiling"; readonly value: number | null; readonly valueFrom: string | null }
  /** rating - value */
  | { readonly form: "belowRating"; readonly rating: string; readonly value: number }
  /** The least of several. */
  | { readonly form: "lowerOf"; readonly terms: readonly LimitForm[] }
  /** An expression over ratings, parameters and other rules' limits. */
  | { readonly form: "formula"; readonly expression: string; readonly uses: readonly string[] }
  /** rating x band[0] <= applied <= rating x band[1] */
  | { readonly form: "band"; readonly rating: string; readonly band: readonly [number, number] };

/** One derating rule of a policy. */
export interface Rule {
  readonly id: string;
  readonly kinds: readonly Kind[];
  /** The part's style; undefined: any, null: only where no style is given. */
  readonly style: string | null | undefined;
  /** Something else the rule asks for that a circuit file does not say: never met silently. */
  readonly alsoNeeds: readonly string[];
  /** Must match the policy's chosen variant. */
  readonly variant: Readonly<Record<string, unknown>> | null;
  readonly quantity: string;
  readonly limit: LimitForm;
  /** `<` instead of `<=`. */
  readonly strict: boolean;
  /** Advice never fails. */
  readonly advice: boolean;
  readonly source: { readonly document: string; readonly clause: string; readonly status: string };
}

export interface Policy {
  readonly id: string;
  readonly name: string;
  readonly rules: readonly Rule[];
}
