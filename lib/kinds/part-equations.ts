/**
 * What a law of a kind writes its equations through, for one part at one iterate. Pins are numbered
 * in the kind's order, a part's own current unknowns from 0. A law must name the same derivatives in
 * the same order every time, whatever the state: the matrix is laid out once and filled often.
 * Voltages in V, currents in A counted into the part, charges in C, fluxes in Vs.
 */
export interface PartEquations {
  /** Temperature of the part, K. */
  readonly kelvin: number;
  /** s; null outside a transient. */
  readonly time: number | null;
  /** 0 to 1: how far the independent sources are turned up (a continuation; 1 in every result). */
  readonly sourceScale: number;
  /** Amplifier gains are capped here (a continuation; infinite in every result). */
  readonly gainCap: number;
  /** S, across junctions (a continuation; at most 1e-12 in a result). */
  readonly junctionShunt: number;

  /** Voltage at a pin against the reference. */
  v(pin: number): number;
  /** Value of the part's unknown k. */
  unknown(k: number): number;
  /** Value of the current that controls this part, or of the j-th part it couples. */
  foreign(j: number): number;

  /** Adds a current that flows into the part at a pin. */
  into(pin: number, current: number): void;
  intoByVoltage(pin: number, by: number, slope: number): void;
  intoByUnknown(pin: number, k: number, slope: number): void;
  intoByForeign(pin: number, j: number, slope: number): void;

  /** Adds to the residual of the equation that belongs to unknown k; it is solved to zero. */
  equation(k: number, residual: number): void;
  equationByVoltage(k: number, pin: number, slope: number): void;
  equationByUnknown(k: number, other: number, slope: number): void;
  equationByForeign(k: number, j: number, slope: number): void;
  /** Adds to the residual of the equation of the j-th coupled part, and its slope by the other one's current. */
  foreignEquation(j: number, residual: number): void;
  foreignEquationByForeign(j: number, other: number, slope: number): void;

  /**
   * The rate of a stored quantity (charge or flux) and the slope of that rate by the quantity: zero
   * at an operating point, the integration formula's in a transient. `tolerance`: an error that does
   * not matter, in the quantity's unit.
   */
  rate(
    slot: number,
    quantity: number,
    tolerance: number,
  ): { readonly rate: number; readonly slope: number };

  /** The voltage at which an exponential may be taken: large steps are shortened, and the solution is then not final. */
  limited(slot: number, voltage: number, thermalVoltage: number, critical: number): number;

  /** A state kept between solutions, as of a comparator with hysteresis. */
  state(slot: number): boolean;
  /** Says what the state should be for this solution; a difference makes the solver try again. */
  wantState(slot: number, wanted: boolean): void;
}

/** The law of a kind: how many current unknowns a part has, and its equations. */
export interface Law<P> {
  /** How many current unknowns a part brings; `controls`: another part is controlled by its current. */
  unknowns(part: P, controls: boolean): number;
  /** How many stored quantities (charges, fluxes) it keeps. */
  readonly stores?: number;
  /** How many exponentials are limited. */
  readonly limits?: number;
  /** How many two-valued states it keeps. */
  readonly states?: number;
  write(part: P, equations: PartEquations, unknowns: number): void;
}
