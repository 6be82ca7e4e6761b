import { notNegative, positive } from "../values/range";
import type { KindDescription } from "./description";
import { choice, flag, required, withDefault } from "./parameter";

export const mosfet: KindDescription<"mosfet"> = {
  kind: "mosfet",
  pins: ["drain", "gate", "source"],
  parameters: {
    channel: choice("n", "p"),
    thresholdVoltage: required("voltage"),
    transconductanceFactor: required("transconductanceFactor", positive),
    channelModulation: withDefault("perVolt", 0, notNegative),
    bodyDiode: flag(false),
  },
};
