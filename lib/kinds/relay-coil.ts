import { notNegative, positive } from "../values/range";
import type { KindDescription } from "./description";
import { orNone, required, withDefault } from "./parameter";

export const relayCoil: KindDescription<"relayCoil"> = {
  kind: "relayCoil",
  pins: ["1", "2"],
  parameters: {
    resistance: required("resistance", notNegative),
    tempco: withDefault("perKelvin", 0),
    inductance: withDefault("inductance", 0, notNegative),
    pullInVoltage: orNone("voltage", positive),
    dropOutVoltage: orNone("voltage", positive),
  },
};
