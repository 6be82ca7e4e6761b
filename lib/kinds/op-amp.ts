import { notNegative, positive } from "../values/range";
import type { KindDescription } from "./description";
import { orNone, withDefault } from "./parameter";

export const opAmp: KindDescription<"opAmp"> = {
  kind: "opAmp",
  pins: ["inPlus", "inMinus", "out", "supplyPlus", "supplyMinus"],
  parameters: {
    openLoopGain: withDefault("ratio", 1e5, positive),
    gainBandwidth: withDefault("frequency", 1e6, positive),
    outputResistance: withDefault("resistance", 0, notNegative),
    offsetVoltage: withDefault("voltage", 0),
    dropToPlus: withDefault("voltage", 0, notNegative),
    dropToMinus: withDefault("voltage", 0, notNegative),
    slewRate: orNone("slewRate", positive),
  },
};
