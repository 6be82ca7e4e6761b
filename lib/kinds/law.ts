/**
 * How a part enters the equations. A law lists the part's terminals (its pins, then inner nets and
 * currents of its own), says which of them depend on which, and for given unknowns tells the current
 * into each pin, the residual of each row of its own, and the derivatives.
 */
export interface Law {
  /** Unknown of each terminal, pins first; 0 is the reference, whose value is 0. */
  readonly terminals: readonly number[];
  /** Rows and columns (unknowns) of the derivatives, in the order of `g` and `c`. */
  readonly rows: readonly number[];
  readonly columns: readonly number[];
  /** By terminal: current into the pin (A), or residual of the row. */
  readonly f: Float64Array;
  /** By terminal: the charge (C) or flux (V s) whose rate adds to `f`. */
  readonly q: Float64Array;
  /** By entry: derivative of `f`. */
  readonly g: Float64Array;
  /** By entry: derivative of `q`. */
  readonly c: Float64Array;
  /** Fills `f`, `q`, `g` and `c` at the unknowns `x`. */
  readonly evaluate: (x: Float64Array, at: Stage) => void;
  /** The derivatives are the same everywhere. */
  readonly linear: boolean;
  /** Which pins a direct current joins, and which it ties by a fixed voltage: for naming what is singular. */
  readonly paths: readonly DirectPath[];
  /** Sets `q` to what a given capacitor voltage (V) or inductor current (A) holds. */
  readonly hold?: (value: number) => void;
  /** Whether a law with a memory is in another state than its unknowns ask for. */
  readonly restless?: (x: Float64Array, at: Stage) => boolean;
  /** Changes that state. */
  readonly flip?: () => void;
}

/** A way for a direct current between two unknowns. */
export interface DirectPath {
  readonly from: number;
  readonly to: number;
  readonly tie:
    | "conducts"
    | "fixesVoltage"
    | "controlsVoltage"
    | "fixesCurrent"
    | "controlsCurrent";
}

/** What the laws are evaluated for. */
export interface Stage {
  /** s; null: operating point, where `dc` counts instead of the waveform. */
  time: number | null;
  /** Part of the independent sources' value, 0 to 1: less than 1 while they are stepped up. */
  sources: number;
  /** S, across junctions: at most 1e-12, and 0 wherever the circuit can be solved without. */
  helping: number;
  /** Largest gain that amplifiers may have while a solution is approached. */
  gainCap: number;
  /** Counted up by every law that did not follow the unknowns all the way. */
  limited: number;
  /** In a course of time comparators switch: their output is one or the other, by their state. */
  switching: boolean;
  /** `cold`: laws begin where a search begins best; `warm`: at the given unknowns; null: they go on. */
  begin: "cold" | "warm" | null;
}

/** Where a part stands: its law asks for the unknowns of its pins and for ones of its own. */
export interface Site {
  /** degrees Celsius */
  readonly temperature: number;
  /** Largest resistance of the circuit, Ω: beside it, small ones need a current of their own. */
  readonly largestResistance: number;
  readonly pin: (name: string) => number;
  /** Whether the pin is on a net; a `null` pin is a net of its own. */
  readonly connected: (name: string) => boolean;
  /** A current that is an unknown. */
  readonly current: () => number;
  /** A net inside the part. */
  readonly inner: () => number;
  /** For controlled sources: the current into the first pin of the controlling part. */
  readonly controlled: ControlledBy | null;
  /** For couplings: the two inductors. */
  readonly coupled: readonly [Winding, Winding] | null;
  /** Volts at which the search begins, by pin; undefined where it is not said. */
  readonly start: (pin: string) => number | undefined;
}

/** A current as a sum of unknowns times factors. */
export type ControlledBy = readonly { readonly unknown: number; readonly factor: number }[];

export interface Winding {
  /** Unknown that is its current; its row is the voltage equation. */
  readonly current: number;
  /** H */
  readonly inductance: number;
}

/** The places of a law, listed while it is made. */
export class Places {
  readonly rows: number[] = [];
  readonly columns: number[] = [];

  /** A place for the derivative of one terminal by another; its number in `g` and `c`. */
  add(row: number, column: number): number {
    this.rows.push(row);
    this.columns.push(column);
    return this.rows.length - 1;
  }
}

/** A law without values yet. */
export function emptyLaw(
  terminals: readonly number[],
  places: Places,
): Omit<Law, "evaluate" | "paths"> {
  return {
    terminals,
    rows: places.rows,
    columns: places.columns,
    f: new Float64Array(terminals.length),
    q: new Float64Array(terminals.length),
    g: new Float64Array(places.rows.length),
    c: new Float64Array(places.rows.length),
    linear: false,
  };
}
