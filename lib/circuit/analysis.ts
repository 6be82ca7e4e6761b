/** What is computed in an operating condition. Times in s, frequencies in Hz. */
export type Analysis =
  | { readonly type: "operatingPoint" }
  | {
      readonly type: "sweep";
      /** `REF.param` of a source or part, or `ambient`. */
      readonly of: string;
      readonly from: number;
      readonly to: number;
      /** Both ends included, at least 2. */
      readonly points: number;
    }
  | {
      readonly type: "frequencyResponse";
      readonly from: number;
      readonly to: number;
      readonly pointsPerDecade: number;
    }
  | {
      readonly type: "transient";
      readonly until: number;
      /** Largest step, s; `until / 500` where the file gives none. */
      readonly maxStep: number;
      /** Nets whose waveform is stored; null: all. */
      readonly record: readonly string[] | null;
      /** Start from all capacitor voltages and inductor currents zero instead of the operating point. */
      readonly fromRest: boolean;
      /** Fixed initial values: `C1.voltage` in V, `L1.current` in A. */
      readonly initial: Readonly<Record<string, number>>;
    };

/** How the tolerances of the parts are spread over the results. */
export interface Spread {
  readonly method: "extremeValue" | "rootSumSquare" | "monteCarlo";
  readonly samples: number;
  readonly seed: number;
  readonly distribution: "uniform" | "normal";
}

/** A source's course in time. Times in s, phases in degrees. */
export type Waveform =
  | {
      readonly shape: "pulse";
      readonly low: number;
      readonly high: number;
      readonly delay: number;
      readonly rise: number;
      readonly fall: number;
      /** Infinity: for ever. */
      readonly width: number;
      /** null: once. */
      readonly period: number | null;
    }
  | {
      readonly shape: "sine";
      readonly offset: number;
      readonly amplitude: number;
      readonly frequency: number;
      readonly delay: number;
      readonly phase: number;
    }
  | {
      readonly shape: "points";
      readonly points: readonly (readonly [time: number, value: number])[];
    }
  | { readonly shape: "step"; readonly from: number; readonly to: number; readonly at: number };
