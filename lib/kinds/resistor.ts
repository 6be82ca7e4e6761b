import { notNegative } from "../values/range";
import type { KindDescription } from "./description";
import { required, tolerance, withDefault } from "./parameter";

export const resistor: KindDescription<"resistor"> = {
  kind: "resistor",
  pins: ["1", "2"],
  parameters: {
    resistance: required("resistance", notNegative),
    tolerance,
    tempco: withDefault("perKelvin", 0),
  },
};
