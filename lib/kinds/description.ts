import type { ParameterOf, ParameterValue } from "./parameter";
import type { Kind, Parts } from "./part";

/** Parameters that do not go together: the one to mend, and a sentence. */
export interface Contradiction {
  readonly parameter: string;
  readonly message: string;
}

/** What the circuit file may say of a kind. */
export interface KindDescription<K extends Kind> {
  readonly kind: K;
  /** In file order; `any`: pins bear any names. */
  readonly pins: readonly string[] | "any";
  /** The pins that may be left out. */
  readonly optionalPins?: readonly string[];
  /** In file order. `tolerance` is the half-width of the first. */
  readonly parameters: { readonly [P in keyof Parts[K]]: ParameterOf<Parts[K][P]> };
  /** What stands beside the pins: a part whose current controls, or two coupled inductors. */
  readonly refersTo?: "control" | "of";
  /** What is wrong with read parameters taken together. */
  readonly contradiction?: (values: ReadonlyMap<string, ParameterValue>) => Contradiction | null;
  /** Whether datasheet points (`fit`) may stand for model numbers. */
  readonly fitted?: true;
}
