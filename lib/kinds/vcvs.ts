import type { KindDescription } from "./description";
import { required } from "./parameter";

export const vcvs: KindDescription<"vcvs"> = {
  kind: "vcvs",
  pins: ["plus", "minus", "controlPlus", "controlMinus"],
  parameters: { gain: required("ratio") },
};
