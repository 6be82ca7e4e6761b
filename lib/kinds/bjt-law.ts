import { JunctionCurrent, saturationCurrentAt, thermalVoltage } from "./junction-current";
import { emptyLaw, type Law, Places, type Site, type Stage } from "./law";
import type { Part } from "./part";

/** eV, and the exponent of the temperature, of every bipolar transistor here. */
const BANDGAP = 1.11;
const EXPONENT = 3;

/**
 * Ebers and Moll's transistor in transport form (1954), with Early's effect:
 * icc = Is (exp(vbe/Vt) - exp(vbc/Vt)) (1 - vbc/VA), ic = icc - ir/BR, ib = if/BF + ir/BR,
 * where if and ir are the junction currents Is (exp(v/Vt) - 1).
 */
export function bjt(part: Part<"bjt">, site: Site): Law {
  const { polarity, saturationCurrent, forwardGain, reverseGain, earlyVoltage } = part.params;
  const sign = polarity === "npn" ? 1 : -1;
  const [collector, base, emitter] = [site.pin("collector"), site.pin("base"), site.pin("emitter")];
  const pins = [collector, base, emitter];
  const places = new Places();
  for (const row of pins) for (const column of pins) places.add(row, column);
  const law = emptyLaw(pins, places);
  const { f, g } = law;
  const vt = thermalVoltage(site.temperature);
  const is = saturationCurrentAt(site.temperature, saturationCurrent, 1, BANDGAP, EXPONENT);
  const forward = new JunctionCurrent(is, vt, null, true);
  const reverse = new JunctionCurrent(is, vt, null, false);
  const perVolt = earlyVoltage === null ? 0 : 1 / earlyVoltage;

  const evaluate = (x: Float64Array, at: Stage): void => {
    const vb = x[base] ?? 0;
    const vbe = sign * (vb - (x[emitter] ?? 0));
    const vbc = sign * (vb - (x[collector] ?? 0));
    forward.follow(vbe, at);
    reverse.follow(vbc, at);
    const helping = at.helping;
    // The helping conductances stand across the junctions themselves, not across the transported current.
    const [iF, gF] = [forward.current - helping * vbe, forward.conductance - helping];
    const [iR, gR] = [reverse.current - helping * vbc, reverse.conductance - helping];
    const early = 1 - vbc * perVolt;
    const ic = (iF - iR) * early - iR / reverseGain - helping * vbc;
    const ib = iF / forwardGain + iR / reverseGain + helping * (vbe + vbc);
    const cBe = gF * early;
    const cBc = -gR * early - (iF - iR) * perVolt - gR / reverseGain - helping;
    const bBe = gF / forwardGain + helping;
    const bBc = gR / reverseGain + helping;
    f[0] = sign * ic;
    f[1] = sign * ib;
    f[2] = -sign * (ic + ib);
    // Columns: collector (-d/dvbc), base (d/dvbe + d/dvbc), emitter (-d/dvbe); the sign squares away.
    g[0] = -cBc;
    g[1] = cBe + cBc;
    g[2] = -cBe;
    g[3] = -bBc;
    g[4] = bBe + bBc;
    g[5] = -bBe;
    for (let k = 0; k < 3; k++) g[6 + k] = -(g[k] ?? 0) - (g[3 + k] ?? 0);
  };
  return {
    ...law,
    evaluate,
    paths: [
      { from: base, to: emitter, tie: "conducts" },
      { from: base, to: collector, tie: "conducts" },
    ],
  };
}
