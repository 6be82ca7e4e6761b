import { type ChannelCurrent, channelLaw } from "./channel-law";
import { junctionAt } from "./junction-current";
import type { Law, Site } from "./law";
import type { Junction, Part } from "./part";

/** The body diode has the diode's defaults. */
const BODY: Junction = {
  saturationCurrent: 1e-14,
  emissionCoefficient: 1,
  seriesResistance: 0,
  breakdownVoltage: null,
  breakdownCurrent: 1e-3,
  bandgap: 1.11,
  saturationTempExponent: 3,
  junctionCapacitance: 0,
  transitTime: 0,
};

/** Shichman and Hodges' square law (1968). */
export function mosfet(part: Part<"mosfet">, site: Site): Law {
  const { channel, thresholdVoltage, transconductanceFactor, channelModulation } = part.params;
  const sign = channel === "n" ? 1 : -1;
  const threshold = sign * thresholdVoltage;
  const fill = (vgs: number, vds: number, out: ChannelCurrent): void => {
    const over = vgs - threshold;
    if (over <= 0) {
      out.current = 0;
      out.byGate = 0;
      out.byDrain = 0;
      return;
    }
    const saturated = vds >= over;
    const drive = saturated ? (over * over) / 2 : over * vds - (vds * vds) / 2;
    const modulation = 1 + channelModulation * vds;
    out.current = transconductanceFactor * drive * modulation;
    out.byGate = transconductanceFactor * (saturated ? over : vds) * modulation;
    out.byDrain =
      transconductanceFactor *
      ((saturated ? 0 : over - vds) * modulation + drive * channelModulation);
  };
  const body = part.params.bodyDiode ? junctionAt(BODY, site.temperature, false) : null;
  return channelLaw(site, sign, fill, body);
}
