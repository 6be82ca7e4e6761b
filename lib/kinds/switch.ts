import { notNegative, positive } from "../values/range";
import type { KindDescription } from "./description";
import { flag, waveform, withDefault } from "./parameter";

/** `closed` left out is open. The waveform has no unit: the switch is closed while it is above 0.5. */
export const switchKind: KindDescription<"switch"> = {
  kind: "switch",
  pins: ["1", "2"],
  parameters: {
    closed: flag(false),
    closedResistance: withDefault("resistance", 1e-3, notNegative),
    openResistance: withDefault("resistance", 1e9, positive),
    waveform: waveform("ratio"),
  },
};
