import type { KindDescription } from "./description";

export const testPoint: KindDescription<"testPoint"> = {
  kind: "testPoint",
  pins: "any",
  parameters: {},
};
