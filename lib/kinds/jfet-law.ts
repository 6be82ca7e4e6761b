import { type ChannelCurrent, channelLaw } from "./channel-law";
import type { Law, Site } from "./law";
import type { Part } from "./part";

/** Square law: idss u² saturated, idss (2 u w - w²) below, with u = 1 - vgs/vp and w = vds/-vp. */
export function jfet(part: Part<"jfet">, site: Site): Law {
  const { channel, pinchOffVoltage, saturatedDrainCurrent } = part.params;
  const sign = channel === "n" ? 1 : -1;
  const pinch = -sign * pinchOffVoltage;
  const fill = (vgs: number, vds: number, out: ChannelCurrent): void => {
    const u = Math.max(0, 1 + vgs / pinch);
    const w = Math.min(vds / pinch, u);
    out.current = saturatedDrainCurrent * (2 * u * w - w * w);
    out.byGate = (saturatedDrainCurrent * 2 * w) / pinch;
    out.byDrain = (saturatedDrainCurrent * 2 * (u - w)) / pinch;
  };
  return channelLaw(site, sign, fill, null);
}
