import { positive } from "../values/range";
import type { KindDescription } from "./description";
import { required, withDefault } from "./parameter";

export const lamp: KindDescription<"lamp"> = {
  kind: "lamp",
  pins: ["1", "2"],
  parameters: {
    ratedVoltage: required("voltage", positive),
    ratedPower: required("power", positive),
    exponent: withDefault("ratio", 0.55, positive),
  },
};
