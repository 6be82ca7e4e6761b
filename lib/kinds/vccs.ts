import type { KindDescription } from "./description";
import { required } from "./parameter";

export const vccs: KindDescription<"vccs"> = {
  kind: "vccs",
  pins: ["plus", "minus", "controlPlus", "controlMinus"],
  parameters: { transconductance: required("transconductance") },
};
