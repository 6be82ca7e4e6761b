import type { Point, Sheet, Wire } from "./drawing";

/** A value as written: a number in SI units, or a text such as `4k7` or `100 nF`. */
export type WrittenValue = number | string;

/** The circuit file as written, after its JSON is parsed. `readCircuitFile` says whether an object is one. */
export interface CircuitFile {
  readonly ampersign: 1;
  readonly title?: string;
  readonly reference?: string;
  readonly top?: string;
  readonly blocks: Readonly<Record<string, FileBlock>>;
  readonly conditions?: readonly FileCondition[];
  readonly limits?: readonly FileLimit[];
  readonly policy?: FilePolicy;
}

export interface FileBlock {
  readonly ports?: readonly string[];
  readonly parts: readonly FilePart[];
  readonly wires?: readonly Wire[];
  readonly sheet?: Sheet;
}

/** A part, or with `kind: "block"` a use of another block. */
export interface FilePart {
  readonly ref: string;
  readonly kind: string;
  readonly pins?: Readonly<Record<string, string | null>>;
  readonly params?: Readonly<Record<string, FileParameter>>;
  readonly control?: string;
  readonly of?: readonly [string, string];
  readonly ratings?: Readonly<Record<string, WrittenValue>>;
  readonly thermal?: { readonly junctionToAmbient: WrittenValue };
  readonly style?: string;
  readonly fit?: readonly { readonly current: WrittenValue; readonly voltage: WrittenValue }[];
  readonly tolerances?: Readonly<Record<string, WrittenValue>>;
  readonly drift?: { readonly bias?: WrittenValue; readonly random?: WrittenValue };
  readonly temperature?: WrittenValue;
  readonly fitted?: boolean;
  readonly note?: string;
  readonly id?: string;
  readonly at?: Point;
  /** Quarter turns, clockwise. */
  readonly turn?: 0 | 1 | 2 | 3;
  readonly mirror?: boolean;
  /** Of a use of a block: its name, and its overrides. */
  readonly block?: string;
  readonly set?: Readonly<Record<string, FileParameter>>;
}

/** A parameter as written; null where "none" is meant. */
export type FileParameter = WrittenValue | boolean | null | FileWaveform;

export type FileWaveform =
  | {
      readonly pulse: {
        readonly low: WrittenValue;
        readonly high: WrittenValue;
        readonly delay?: WrittenValue;
        readonly rise?: WrittenValue;
        readonly fall?: WrittenValue;
        readonly width?: WrittenValue;
        readonly period?: WrittenValue;
      };
    }
  | {
      readonly sine: {
        readonly offset?: WrittenValue;
        readonly amplitude: WrittenValue;
        readonly frequency: WrittenValue;
        readonly delay?: WrittenValue;
        readonly phase?: WrittenValue;
      };
    }
  | { readonly points: readonly (readonly [WrittenValue, WrittenValue])[] }
  | {
      readonly step: {
        readonly from: WrittenValue;
        readonly to: WrittenValue;
        readonly at: WrittenValue;
      };
    };

export interface FileCondition {
  readonly name: string;
  readonly ambient?: WrittenValue;
  readonly set?: Readonly<Record<string, FileParameter>>;
  readonly analysis?: FileAnalysis;
  readonly start?: { readonly nets: Readonly<Record<string, WrittenValue>> };
  readonly spread?: {
    readonly method: "extremeValue" | "rootSumSquare" | "monteCarlo";
    readonly samples?: number;
    readonly seed?: number;
    readonly distribution?: "uniform" | "normal";
  };
  readonly selfHeating?: boolean;
}

export type FileAnalysis =
  | { readonly type: "operatingPoint" }
  | {
      readonly type: "sweep";
      readonly of: string;
      readonly from: WrittenValue;
      readonly to: WrittenValue;
      readonly points: number;
    }
  | {
      readonly type: "frequencyResponse";
      readonly from: WrittenValue;
      readonly to: WrittenValue;
      readonly pointsPerDecade: number;
    }
  | {
      readonly type: "transient";
      readonly until: WrittenValue;
      readonly maxStep?: WrittenValue;
      readonly record?: readonly string[];
      readonly from?: "rest";
      readonly initial?: Readonly<Record<string, WrittenValue>>;
    };

interface FileBounds {
  readonly min?: WrittenValue;
  readonly max?: WrittenValue;
  readonly condition?: string;
}

export type FileLimit = FileBounds &
  (
    | { readonly net: string }
    | { readonly between: readonly [string, string] }
    | { readonly part: string; readonly quantity: string }
  );

export interface FilePolicy {
  readonly use?: string;
  readonly variant?: unknown;
  readonly rules?: readonly unknown[];
}
