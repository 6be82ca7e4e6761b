import { anyValue, notNegative, positive } from "../values/range";
import type { KindDescription } from "./description";
import { flag, orNone, withDefault } from "./parameter";

export const comparator: KindDescription<"comparator"> = {
  kind: "comparator",
  pins: ["inPlus", "inMinus", "out", "supplyPlus", "supplyMinus"],
  parameters: {
    gain: withDefault("ratio", 1e6, positive),
    offsetVoltage: withDefault("voltage", 0),
    hysteresis: withDefault("voltage", 0, notNegative),
    openCollector: flag(false),
    outputResistance: withDefault("resistance", 0, notNegative),
    dropToPlus: withDefault("voltage", 0, notNegative),
    dropToMinus: withDefault("voltage", 0, notNegative),
    delay: withDefault("time", 0, notNegative),
    outputLow: orNone("voltage", anyValue),
    outputHigh: orNone("voltage", anyValue),
  },
  contradiction: (values) => {
    const [low, high] = [values.get("outputLow"), values.get("outputHigh")];
    if (typeof low !== "number" || typeof high !== "number" || low < high) return null;
    return {
      parameter: "outputHigh",
      message: "The output's high level must be above its low one.",
    };
  },
};
