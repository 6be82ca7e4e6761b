import type { KindDescription } from "./description";

export const connector: KindDescription<"connector"> = {
  kind: "connector",
  pins: "any",
  parameters: {},
};
