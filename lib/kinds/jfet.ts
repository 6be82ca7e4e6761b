import { positive } from "../values/range";
import type { KindDescription } from "./description";
import { choice, required } from "./parameter";

export const jfet: KindDescription<"jfet"> = {
  kind: "jfet",
  pins: ["drain", "gate", "source"],
  parameters: {
    channel: choice("n", "p"),
    pinchOffVoltage: required("voltage"),
    saturatedDrainCurrent: required("current", positive),
  },
};
