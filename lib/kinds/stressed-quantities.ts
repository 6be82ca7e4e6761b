import type { Kind, Part } from "./part";

/** A part at one moment: voltages of its pins against the reference (V), currents into them (A), power absorbed (W). */
export interface PartState {
  readonly pinVoltages: Readonly<Record<string, number>>;
  readonly currents: Readonly<Record<string, number>>;
  readonly power: number;
  /** Temperature of the part, degrees Celsius. */
  readonly temperature: number;
}

type Quantities = Readonly<Record<string, number>>;
type Stressed = (state: PartState) => Quantities;

const voltage = (state: PartState, plus: string, minus: string): number =>
  (state.pinVoltages[plus] ?? 0) - (state.pinVoltages[minus] ?? 0);
const current = (state: PartState, pin: string): number => state.currents[pin] ?? 0;
const size = Math.abs;
const above = (value: number): number => Math.max(value, 0);

/** Two pins: directed quantities in absolute value. */
const twoPin: Stressed = (state) => {
  const i = size(current(state, "1"));
  return { voltage: size(voltage(state, "1", "2")), current: i, peakCurrent: i };
};

/** Forward and reverse are different stresses of a junction. */
const junction: Stressed = (state) => ({
  reverseVoltage: above(-voltage(state, "anode", "cathode")),
  forwardCurrent: above(current(state, "anode")),
  surgeCurrent: above(current(state, "anode")),
});

/** `current` is that through the channel, as `voltage` is that across it. */
const fieldEffect: Stressed = (state) => ({
  current: size(current(state, "drain")),
  voltage: size(voltage(state, "drain", "source")),
  drainSourceVoltage: size(voltage(state, "drain", "source")),
  drainGateVoltage: size(voltage(state, "drain", "gate")),
  gateSourceVoltage: size(voltage(state, "gate", "source")),
  drainCurrent: size(current(state, "drain")),
});

const amplifier: Stressed = (state) => ({
  supplyVoltage: voltage(state, "supplyPlus", "supplyMinus"),
  inputVoltage: Math.max(
    size(voltage(state, "inPlus", "supplyMinus")),
    size(voltage(state, "inMinus", "supplyMinus")),
  ),
  outputCurrent: size(current(state, "out")),
});

const source: Stressed = (state) => ({ voltage: size(voltage(state, "plus", "minus")) });
const nothing: Stressed = () => ({});

/** What each kind is stressed by, besides power and temperature which every kind has. A kind without a row does not compile. */
const stressed: Readonly<Record<Kind, Stressed>> = {
  resistor: twoPin,
  // At an operating point no ripple flows; in a transient its root mean square counts.
  // Pin 1 is the positive one of a polarised capacitor.
  capacitor: (state) => ({
    ...twoPin(state),
    reverseVoltage: above(-voltage(state, "1", "2")),
    rippleCurrent: size(current(state, "1")),
  }),
  inductor: twoPin,
  coupling: nothing,
  voltageSource: source,
  currentSource: nothing,
  vcvs: source,
  vccs: source,
  ccvs: source,
  cccs: source,
  diode: junction,
  zener: junction,
  led: junction,
  schottky: junction,
  bjt: (state) => ({
    voltage: size(voltage(state, "collector", "emitter")),
    current: size(current(state, "collector")),
    collectorEmitterVoltage: size(voltage(state, "collector", "emitter")),
    collectorCurrent: size(current(state, "collector")),
  }),
  mosfet: fieldEffect,
  jfet: fieldEffect,
  opAmp: amplifier,
  comparator: amplifier,
  switch: twoPin,
  thermistor: twoPin,
  potentiometer: (state) => ({
    voltage: size(voltage(state, "1", "2")),
    current: Math.max(size(current(state, "1")), size(current(state, "2"))),
  }),
  fuse: twoPin,
  relayCoil: twoPin,
  lamp: twoPin,
  linearRegulator: (state) => ({
    inputVoltage: voltage(state, "in", "common"),
    outputCurrent: size(current(state, "out")),
  }),
  voltageReference: (state) => ({ current: size(current(state, "cathode")) }),
  optocoupler: (state) => ({
    ...junction(state),
    collectorEmitterVoltage: size(voltage(state, "collector", "emitter")),
    collectorCurrent: size(current(state, "collector")),
  }),
  transformer: (state) => ({ voltage: size(voltage(state, "primary1", "primary2")) }),
  connector: nothing,
  testPoint: nothing,
};

/**
 * Every quantity of a part that a derating rule may ask for, at one moment. The junction temperature,
 * ambient + power x junctionToAmbient, is there only where the part gives the thermal resistance.
 */
export function stressedQuantities(part: Part, state: PartState): Quantities {
  const power = size(state.power);
  return {
    power,
    temperature: state.temperature,
    ...stressed[part.kind](state),
    ...(part.junctionToAmbient !== null && {
      junctionTemperature: state.temperature + power * part.junctionToAmbient,
    }),
  };
}
