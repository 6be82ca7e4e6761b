import { notNegative } from "../values/range";
import type { KindDescription } from "./description";
import { junctionParameters } from "./diode";
import { withDefault } from "./parameter";

export const optocoupler: KindDescription<"optocoupler"> = {
  kind: "optocoupler",
  pins: ["anode", "cathode", "collector", "emitter"],
  parameters: {
    ...junctionParameters,
    transferRatio: withDefault("ratio", 1, notNegative),
    saturationVoltage: withDefault("voltage", 0.2, notNegative),
  },
};
