import type { KindDescription } from "./description";
import { waveform, withDefault } from "./parameter";

export const currentSource: KindDescription<"currentSource"> = {
  kind: "currentSource",
  pins: ["from", "to"],
  parameters: {
    dc: withDefault("current", 0),
    ac: withDefault("current", 0),
    acPhase: withDefault("angle", 0),
    waveform: waveform("current"),
  },
};
