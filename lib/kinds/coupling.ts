import { unitInterval } from "../values/range";
import type { KindDescription } from "./description";
import { required } from "./parameter";

export const coupling: KindDescription<"coupling"> = {
  kind: "coupling",
  pins: [],
  parameters: { coefficient: required("ratio", unitInterval) },
  refersTo: "of",
};
