import type { KindDescription } from "./description";
import { required } from "./parameter";

export const ccvs: KindDescription<"ccvs"> = {
  kind: "ccvs",
  pins: ["plus", "minus"],
  parameters: { transresistance: required("transresistance") },
  refersTo: "control",
};
