import { positive } from "../values/range";
import type { KindDescription } from "./description";
import { required, tolerance } from "./parameter";

export const thermistor: KindDescription<"thermistor"> = {
  kind: "thermistor",
  pins: ["1", "2"],
  parameters: {
    resistance25: required("resistance", positive),
    beta: required("kelvin", positive),
    tolerance,
  },
};
