import type { Waveform } from "../circuit/analysis";
import type { Quantity } from "../values/quantity";
import { anyValue, halfWidth, type Range } from "../values/range";

/** What a parameter may hold once it is read. */
export type ParameterValue = number | boolean | string | null | Waveform;

/** A number with a unit. `default` absent: must be given; null: "none". */
interface QuantityParameter<Default extends number | null> {
  readonly form: "quantity";
  readonly quantity: Quantity;
  readonly range: Range;
  readonly default?: Default;
}

interface FlagParameter {
  readonly form: "flag";
  readonly default: boolean;
}

/** One of a few words; must be given. */
interface ChoiceParameter<Word extends string> {
  readonly form: "choice";
  readonly words: readonly Word[];
}

/** A course in time whose values measure `quantity`; null: none. */
interface WaveformParameter {
  readonly form: "waveform";
  readonly quantity: Quantity;
  readonly default: null;
}

/** How a parameter that holds `Value` is described. */
export type ParameterOf<Value> = [Value] extends [number]
  ? QuantityParameter<number>
  : [Value] extends [number | null]
    ? QuantityParameter<null> & { readonly default: null }
    : [Value] extends [boolean]
      ? FlagParameter
      : [Value] extends [string]
        ? ChoiceParameter<Value>
        : WaveformParameter;

export type Parameter =
  | QuantityParameter<number | null>
  | FlagParameter
  | ChoiceParameter<string>
  | WaveformParameter;

/** A number that must be given. */
export function required(quantity: Quantity, range: Range = anyValue): QuantityParameter<number> {
  return { form: "quantity", quantity, range };
}

/** A number with a default. */
export function withDefault(
  quantity: Quantity,
  value: number,
  range: Range = anyValue,
): QuantityParameter<number> {
  return { form: "quantity", quantity, range, default: value };
}

/** A number that may be left out, which then means "none". */
export function orNone(
  quantity: Quantity,
  range: Range,
): QuantityParameter<null> & { readonly default: null } {
  return { form: "quantity", quantity, range, default: null };
}

/** The half-width of a kind's first parameter, as a fraction. */
export const tolerance: QuantityParameter<number> = withDefault("fraction", 0, halfWidth);

export function flag(value: boolean): FlagParameter {
  return { form: "flag", default: value };
}

export function choice<Word extends string>(...words: readonly Word[]): ChoiceParameter<Word> {
  return { form: "choice", words };
}

export function waveform(quantity: Quantity): WaveformParameter {
  return { form: "waveform", quantity, default: null };
}

/** Whether a read value is one that the parameter may hold. */
export function holds(parameter: Parameter, value: unknown): boolean {
  switch (parameter.form) {
    case "quantity":
      return typeof value === "number" || (value === null && parameter.default === null);
    case "flag":
      return typeof value === "boolean";
    case "choice":
      return parameter.words.some((word) => word === value);
    case "waveform":
      return value === null || (typeof value === "object" && "shape" in value);
  }
}
