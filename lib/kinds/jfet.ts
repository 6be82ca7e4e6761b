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
  contradiction: (values) => {
    const [sign, word] = values.get("channel") === "n" ? [-1, "below"] : [1, "above"];
    const message = `The pinch-off voltage of this channel must be ${word} zero.`;
    const pinchOff = Number(values.get("pinchOffVoltage"));
    return sign * pinchOff > 0 ? null : { parameter: "pinchOffVoltage", message };
  },
};
