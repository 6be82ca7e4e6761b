import { positive } from "../values/range";
import type { KindDescription } from "./description";
import { choice, orNone, withDefault } from "./parameter";

export const bjt: KindDescription<"bjt"> = {
  kind: "bjt",
  pins: ["collector", "base", "emitter"],
  parameters: {
    polarity: choice("npn", "pnp"),
    saturationCurrent: withDefault("current", 1e-14, positive),
    forwardGain: withDefault("ratio", 100, positive),
    reverseGain: withDefault("ratio", 1, positive),
    earlyVoltage: orNone("voltage", positive),
  },
};
