import { emptyLaw, type Law, Places, type Site, type Stage } from "./law";
import type { Part } from "./part";
import { Saturation } from "./saturation";
import { suppliesOf } from "./supply-return";

/** V: see the operational amplifier. */
const LEAST_HALF = 1e-3;
/** S, of an open collector that conducts, and of one that does not. */
const ON = 1 / 25;
const OFF = 1e-9;

/**
 * An amplifier whose input is compared against half the hysteresis by the state of its output; with an
 * open collector, a switch to supplyMinus that conducts while inPlus < inMinus.
 */
export function comparator(part: Part<"comparator">, site: Site): Law {
  const { gain, offsetVoltage, hysteresis, openCollector } = part.params;
  const inPlus = site.pin("inPlus");
  const inMinus = site.pin("inMinus");
  const started = site.start("out");
  const state = { high: started !== undefined && started > 0 };
  const difference = (x: Float64Array): number =>
    (x[inPlus] ?? 0) - (x[inMinus] ?? 0) + offsetVoltage;
  const error = (x: Float64Array): number =>
    difference(x) + (state.high ? hysteresis / 2 : -hysteresis / 2);
  const restless = (x: Float64Array, at: Stage): boolean => {
    if (hysteresis === 0 && !at.switching) return false;
    return state.high ? error(x) < 0 : error(x) > 0;
  };
  const flip = (): void => {
    state.high = !state.high;
  };
  const output = outputBy(state, error, gain);
  const law = openCollector ? openOutput(part, site, output) : drivenOutput(part, site, output);
  return { ...law, restless, flip };
}

/** Where the output stands between its ends, -1 to 1, and its slope by the input, for a half range. */
interface Output {
  readonly follow: (x: Float64Array, at: Stage, half: number) => void;
  value: number;
  slope: number;
  byInput: number;
  argument: number;
}

function outputBy(
  state: { readonly high: boolean },
  error: (x: Float64Array) => number,
  gain: number,
): Output {
  const saturation = new Saturation();
  const follow = (x: Float64Array, at: Stage, half: number): void => {
    if (at.switching) {
      output.value = state.high ? 1 : -1;
      output.slope = 0;
      output.byInput = 0;
      output.argument = 0;
      return;
    }
    const most = Math.min(gain, at.gainCap);
    output.argument = (most * error(x)) / half;
    saturation.follow(output.argument, at);
    output.value = saturation.value;
    output.slope = saturation.slope;
    output.byInput = saturation.slope * most;
  };
  const output: Output = { follow, value: 0, slope: 0, byInput: 0, argument: 0 };
  return output;
}

function openOutput(part: Part<"comparator">, site: Site, output: Output): Law {
  const { plus, minus } = suppliesOf(site);
  const [inPlus, inMinus, out] = [site.pin("inPlus"), site.pin("inMinus"), site.pin("out")];
  const places = new Places();
  for (const row of [out, minus])
    for (const column of [out, minus, inPlus, inMinus]) places.add(row, column);
  const law = emptyLaw([inPlus, inMinus, out, plus, minus], places);
  const { f, g } = law;
  const resistance = part.params.outputResistance;
  const on = 1 / (1 / ON + resistance);
  const evaluate = (x: Float64Array, at: Stage): void => {
    output.follow(x, at, 1);
    const v = (x[out] ?? 0) - (x[minus] ?? 0);
    const conductance = OFF + ((on - OFF) * (1 - output.value)) / 2;
    const byError = (-(on - OFF) * output.byInput * v) / 2;
    f[2] = conductance * v;
    f[4] = -f[2];
    const row = [conductance, -conductance, byError, -byError];
    for (let k = 0; k < 4; k++) {
      g[k] = row[k] ?? 0;
      g[4 + k] = -(row[k] ?? 0);
    }
  };
  return { ...law, evaluate, paths: [{ from: out, to: minus, tie: "conducts" }] };
}

function drivenOutput(part: Part<"comparator">, site: Site, output: Output): Law {
  const { outputResistance, dropToPlus, dropToMinus, outputLow, outputHigh } = part.params;
  const supplies = suppliesOf(site);
  const [inPlus, inMinus, out] = [site.pin("inPlus"), site.pin("inMinus"), site.pin("out")];
  const current = site.current();
  const places = new Places();
  places.add(out, current);
  places.add(supplies.plus, current);
  places.add(supplies.minus, current);
  for (const column of [out, supplies.plus, supplies.minus, current, inPlus, inMinus])
    places.add(current, column);
  const pins = [inPlus, inMinus, out, site.pin("supplyPlus"), site.pin("supplyMinus")];
  const law = emptyLaw([...pins, current, 0], places);
  const { f, g } = law;

  const evaluate = (x: Float64Array, at: Stage): void => {
    const i = x[current] ?? 0;
    g[0] = 1;
    g[1] = i < 0 ? -1 : 0;
    g[2] = i < 0 ? 0 : -1;
    f[2] = i;
    f[3] = supplies.plus === 0 ? 0 : (g[1] ?? 0) * i;
    f[4] = supplies.minus === 0 ? 0 : (g[2] ?? 0) * i;
    f[6] = -i - (f[3] ?? 0) - (f[4] ?? 0);

    const high = outputHigh ?? (x[supplies.plus] ?? 0) - dropToPlus;
    const low = outputLow ?? (x[supplies.minus] ?? 0) + dropToMinus;
    const half = Math.max((high - low) / 2, LEAST_HALF);
    output.follow(x, at, half);
    const { value, slope, byInput, argument } = output;
    const byHalf = half > LEAST_HALF ? (value - argument * slope) / 2 : 0;
    f[5] = (x[out] ?? 0) - (high + low) / 2 - half * value - outputResistance * i;
    g[3] = 1;
    g[4] = outputHigh === null ? -0.5 - byHalf : 0;
    g[5] = outputLow === null ? -0.5 + byHalf : 0;
    g[6] = -outputResistance;
    g[7] = -byInput;
    g[8] = byInput;
  };
  return { ...law, evaluate, paths: [{ from: out, to: supplies.plus, tie: "controlsVoltage" }] };
}
