import type { Waveform } from "../circuit/analysis";
import type { Point } from "../circuit/drawing";

/** The parameters of each kind, read: SI units, defaults filled in, `null` where "none" is the default. */
export interface Parts {
  resistor: { readonly resistance: number; readonly tolerance: number; readonly tempco: number };
  capacitor: {
    readonly capacitance: number;
    readonly tolerance: number;
    readonly seriesResistance: number;
    readonly leakageResistance: number | null;
  };
  inductor: {
    readonly inductance: number;
    readonly tolerance: number;
    readonly seriesResistance: number;
  };
  coupling: { readonly coefficient: number };
  voltageSource: Source;
  currentSource: Source;
  vcvs: { readonly gain: number };
  vccs: { readonly transconductance: number };
  ccvs: { readonly transresistance: number };
  cccs: { readonly gain: number };
  diode: Junction;
  zener: Junction;
  led: Junction;
  schottky: Junction;
  bjt: {
    readonly polarity: "npn" | "pnp";
    readonly saturationCurrent: number;
    readonly forwardGain: number;
    readonly reverseGain: number;
    readonly earlyVoltage: number | null;
  };
  mosfet: {
    readonly channel: "n" | "p";
    readonly thresholdVoltage: number;
    readonly transconductanceFactor: number;
    readonly channelModulation: number;
    readonly bodyDiode: boolean;
  };
  jfet: {
    readonly channel: "n" | "p";
    readonly pinchOffVoltage: number;
    readonly saturatedDrainCurrent: number;
  };
  opAmp: {
    readonly openLoopGain: number;
    readonly gainBandwidth: number;
    readonly outputResistance: number;
    readonly offsetVoltage: number;
    readonly dropToPlus: number;
    readonly dropToMinus: number;
    readonly slewRate: number | null;
  };
  comparator: {
    readonly gain: number;
    readonly offsetVoltage: number;
    readonly hysteresis: number;
    readonly openCollector: boolean;
    readonly outputResistance: number;
    readonly dropToPlus: number;
    readonly dropToMinus: number;
    readonly delay: number;
    /** The output's ends, V to the reference; null: given by the supplies and the drops. */
    readonly outputLow: number | null;
    readonly outputHigh: number | null;
  };
  switch: {
    readonly closed: boolean;
    readonly closedResistance: number;
    readonly openResistance: number;
    readonly waveform: Waveform | null;
  };
  thermistor: {
    readonly resistance25: number;
    readonly beta: number;
    readonly tolerance: number;
  };
  potentiometer: {
    readonly resistance: number;
    readonly position: number;
    readonly tolerance: number;
  };
  fuse: { readonly resistance: number };
  relayCoil: {
    readonly resistance: number;
    readonly tempco: number;
    readonly inductance: number;
    readonly pullInVoltage: number | null;
    readonly dropOutVoltage: number | null;
  };
  lamp: {
    readonly ratedVoltage: number;
    readonly ratedPower: number;
    readonly exponent: number;
  };
  linearRegulator: {
    readonly outputVoltage: number;
    readonly dropout: number;
    readonly quiescentCurrent: number;
    readonly currentLimit: number | null;
    readonly outputResistance: number;
  };
  voltageReference: {
    readonly voltage: number;
    readonly resistance: number;
    readonly minimumCurrent: number;
  };
  optocoupler: Junction & {
    readonly transferRatio: number;
    readonly saturationVoltage: number;
  };
  transformer: {
    readonly turnsRatio: number;
    readonly magnetisingInductance: number;
    readonly leakageInductance: number;
    readonly primaryResistance: number;
    readonly secondaryResistance: number;
  };
  connector: Readonly<Record<never, never>>;
  testPoint: Readonly<Record<never, never>>;
}

/** Independent source: V or A; `acPhase` in degrees. */
interface Source {
  readonly dc: number;
  readonly ac: number;
  readonly acPhase: number;
  readonly waveform: Waveform | null;
}

/** The junction law's numbers, shared by the diode family. `bandgap` in eV. */
export interface Junction {
  readonly saturationCurrent: number;
  readonly emissionCoefficient: number;
  readonly seriesResistance: number;
  readonly breakdownVoltage: number | null;
  readonly breakdownCurrent: number;
  readonly bandgap: number;
  readonly saturationTempExponent: number;
  readonly junctionCapacitance: number;
  readonly transitTime: number;
}

export type Kind = keyof Parts;

/** What every part has besides its parameters. */
export interface PartBody {
  /** Address in the flattened circuit: `R1`, `X1/R1`. */
  readonly path: string;
  /** Net of each pin; null: a private net that nothing else touches. */
  readonly pins: Readonly<Record<string, string | null>>;
  /** For `ccvs`, `cccs`: the path of the part whose current controls. */
  readonly control: string | null;
  /** For `coupling`: the paths of the two inductors. */
  readonly of: readonly [string, string] | null;
  readonly ratings: Readonly<Record<string, number>>;
  /** K/W; null where not given. */
  readonly junctionToAmbient: number | null;
  readonly style: string | null;
  /** Half-widths of parameters other than the first (which `params.tolerance` serves), as fractions. */
  readonly tolerances: Readonly<Record<string, number>>;
  readonly drift: { readonly bias: number; readonly random: number } | null;
  /** degrees Celsius; null: at the condition's ambient. */
  readonly temperature: number | null;
  readonly id: string | null;
  readonly note: string | null;
  readonly at: Point | null;
  /** JSON Pointer of the part in the file. */
  readonly pointer: string;
}

/** A part of the flattened circuit, typed by its kind. */
export type Part<K extends Kind = Kind> = {
  [P in K]: PartBody & { readonly kind: P; readonly params: Parts[P] };
}[K];
