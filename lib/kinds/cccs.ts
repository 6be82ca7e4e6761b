import type { KindDescription } from "./description";
import { required } from "./parameter";

export const cccs: KindDescription<"cccs"> = {
  kind: "cccs",
  pins: ["plus", "minus"],
  parameters: { gain: required("ratio") },
  refersTo: "control",
};
