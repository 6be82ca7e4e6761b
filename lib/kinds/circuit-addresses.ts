import type { Addresses } from "../circuit/addresses";
import type { Place } from "../circuit/place";
import { splitAddress } from "../circuit/read-analysis";
import { meaning } from "../values/nearest-word";
import type { Quantity } from "../values/quantity";
import { quoted } from "../values/read-value";
import { type Block, type BlockPart, type Blocks, findEntry } from "./block";
import { findPart, noSuchParameter, settable } from "./override";
import type { Kind } from "./part";

/** The nets of a circuit; `clear` is false where some could not be made out. */
export interface KnownNets {
  readonly fitted: ReadonlySet<string>;
  readonly unfitted: ReadonlySet<string>;
  readonly clear: boolean;
}

/** What a transient may fix at its start. */
const STATES: Partial<Record<Kind, { readonly name: string; readonly quantity: Quantity }>> = {
  capacitor: { name: "voltage", quantity: "voltage" },
  inductor: { name: "current", quantity: "current" },
  relayCoil: { name: "current", quantity: "current" },
};

/** Where there is no top block, nothing resolves and nothing that refers is at fault. */
const nothing: Addresses = {
  net: () => false,
  part: () => false,
  parameter: () => null,
  state: () => null,
};

/** Resolves what conditions and limits refer to, in the circuit below `top`. */
export function circuitAddresses(blocks: Blocks, top: Block | null, nets: KnownNets): Addresses {
  if (top === null) return nothing;
  const fittedPart = (place: Place, path: string): BlockPart | null => {
    const part = findPart(place, path, blocks, top);
    const found = findEntry(blocks, top, path);
    if (part === null || found === null || found === "unclear" || found.fitted) return part;
    return place.fault("noSuchPart", `The part ${quoted(path)} is not fitted.`);
  };
  return {
    net(place, name) {
      if (nets.fitted.has(name)) return true;
      if (!nets.clear) return false;
      const hint = meaning(name, nets.fitted);
      const why = nets.unfitted.has(name)
        ? `Only parts that are not fitted touch the net ${quoted(name)}.`
        : `There is no net ${quoted(name)}${hint}`;
      place.fault("noSuchNet", why);
      return false;
    },
    part: (place, path) => fittedPart(place, path) !== null,
    parameter(place, address) {
      const split = splitAddress(place, address);
      const part = split === null ? null : fittedPart(place, split.part);
      if (split === null || part === null) return null;
      const parameter = settable(part, split.name);
      if (parameter === undefined) return noSuchParameter(place, part, split.name);
      if (parameter.form === "quantity") return parameter;
      return place.fault("badValue", `"${address}" is not a number; it cannot be swept.`);
    },
    state(place, address) {
      const split = splitAddress(place, address);
      const part = split === null ? null : fittedPart(place, split.part);
      if (split === null || part === null) return null;
      const state = STATES[part.kind];
      if (state?.name === split.name) return state.quantity;
      const advice = 'only the "voltage" of a capacitor and the "current" of an inductor can.';
      return place.fault(
        "noSuchParam",
        `${quoted(address)} cannot be fixed at the start; ${advice}`,
      );
    },
  };
}
