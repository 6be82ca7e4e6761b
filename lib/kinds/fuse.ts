import { notNegative } from "../values/range";
import type { KindDescription } from "./description";
import { withDefault } from "./parameter";

export const fuse: KindDescription<"fuse"> = {
  kind: "fuse",
  pins: ["1", "2"],
  parameters: { resistance: withDefault("resistance", 10e-3, notNegative) },
};
