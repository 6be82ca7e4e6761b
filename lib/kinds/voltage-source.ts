import type { KindDescription } from "./description";
import { waveform, withDefault } from "./parameter";

export const voltageSource: KindDescription<"voltageSource"> = {
  kind: "voltageSource",
  pins: ["plus", "minus"],
  parameters: {
    dc: withDefault("voltage", 0),
    ac: withDefault("voltage", 0),
    acPhase: withDefault("angle", 0),
    waveform: waveform("voltage"),
  },
};
