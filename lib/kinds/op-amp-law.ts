import { emptyLaw, type Law, Places, type Site, type Stage } from "./law";
import type { Part } from "./part";
import { Saturation } from "./saturation";
import { suppliesOf } from "./supply-return";

/** V: an amplifier without room between its supplies still has this much, so that its law has a value. */
const LEAST_HALF = 1e-3;
/** Halves of the output range that the inner stage runs beyond it before it is held. */
const HELD_AT = 20;

/**
 * out = mid + half tanh(u / half), where the inner stage's u follows gain (v+ - v- + vos) with one
 * pole at gainBandwidth / gain. The output current returns through the supply it comes from.
 */
export function opAmp(part: Part<"opAmp">, site: Site): Law {
  const { openLoopGain, gainBandwidth, outputResistance, offsetVoltage, slewRate } = part.params;
  const supplies = suppliesOf(site);
  const inPlus = site.pin("inPlus");
  const inMinus = site.pin("inMinus");
  const out = site.pin("out");
  const pins = [inPlus, inMinus, out, site.pin("supplyPlus"), site.pin("supplyMinus")];
  const current = site.current();
  const stage = site.inner();
  const places = new Places();
  places.add(out, current);
  places.add(supplies.plus, current);
  places.add(supplies.minus, current);
  for (const column of [out, stage, supplies.plus, supplies.minus, current])
    places.add(current, column);
  for (const column of [stage, inPlus, inMinus]) places.add(stage, column);
  const law = emptyLaw([...pins, current, stage, 0], places);
  const { f, q, g, c } = law;
  const saturation = new Saturation();
  const rate = 2 * Math.PI * gainBandwidth;
  c[8] = 1 / rate;

  const evaluate = (x: Float64Array, at: Stage): void => {
    const i = x[current] ?? 0;
    const u = x[stage] ?? 0;
    const high = (x[supplies.plus] ?? 0) - part.params.dropToPlus;
    const low = (x[supplies.minus] ?? 0) + part.params.dropToMinus;
    const half = Math.max((high - low) / 2, LEAST_HALF);

    g[0] = 1;
    g[1] = i < 0 ? -1 : 0;
    g[2] = i < 0 ? 0 : -1;
    f[2] = i;
    f[3] = supplies.plus === 0 ? 0 : (g[1] ?? 0) * i;
    f[4] = supplies.minus === 0 ? 0 : (g[2] ?? 0) * i;
    f[7] = -i - (f[3] ?? 0) - (f[4] ?? 0);

    g[3] = 1;
    g[7] = -outputResistance;
    if (supplies.bounded) {
      const s = u / half;
      saturation.follow(s, at);
      const { value, slope } = saturation;
      f[5] = (x[out] ?? 0) - (high + low) / 2 - half * value - outputResistance * i;
      g[4] = -slope;
      const byHalf = half > LEAST_HALF ? (value - s * slope) / 2 : 0;
      g[5] = -0.5 - byHalf;
      g[6] = -0.5 + byHalf;
    } else {
      f[5] = (x[out] ?? 0) - u - outputResistance * i;
      g[4] = -1;
      g[5] = 0;
      g[6] = 0;
    }

    const gain = Math.min(openLoopGain, at.gainCap);
    const error = (x[inPlus] ?? 0) - (x[inMinus] ?? 0) + offsetVoltage - u / gain;
    let slope = 1;
    let followed = error;
    if (slewRate !== null && at.time !== null) {
      const most = slewRate / rate;
      const bent = Math.tanh(error / most);
      followed = most * bent;
      slope = 1 - bent * bent;
    }
    f[6] = -followed;
    g[8] = slope / gain;
    g[9] = -slope;
    g[10] = slope;
    q[6] = u / rate;
    const beyond = Math.abs(u) - HELD_AT * half;
    if (at.time !== null && supplies.bounded && beyond > 0) {
      f[6] += Math.sign(u) * beyond;
      g[8] += 1;
    }
  };
  const paths = [{ from: out, to: supplies.plus, tie: "controlsVoltage" as const }];
  return { ...law, evaluate, paths };
}
