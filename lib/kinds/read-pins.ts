import { checkName, readName } from "../circuit/names";
import type { Place } from "../circuit/place";
import { meaning } from "../values/nearest-word";
import { quoted } from "../values/read-value";

/** What pins a part must and may have; null: any. */
export interface AllowedPins {
  readonly required: readonly string[];
  readonly optional: readonly string[];
}

/** The net of each pin (null: on no net), and whether all of it was good. */
export interface ReadPins {
  readonly pins: ReadonlyMap<string, string | null>;
  readonly good: boolean;
}

/** Reads the pins of a part. What could be read comes back even where something is wrong. */
export function readPins(part: Place, place: Place | null, allowed: AllowedPins | null): ReadPins {
  const pins = new Map<string, string | null>();
  if (place === null) {
    const needed = allowed === null || allowed.required.length > 0;
    if (needed) part.fault("missingKey", 'The key "pins" is missing here; add it.');
    return { pins, good: !needed };
  }
  const entries = place.entries();
  if (entries === null) return { pins, good: false };
  let good = true;
  const known = allowed === null ? null : [...allowed.required, ...allowed.optional];
  for (const [pin, net] of entries) {
    if (known !== null && !known.includes(pin)) {
      const hint = meaning(pin, known);
      const names = known.length === 0 ? "It has none." : `Its pins are ${known.join(", ")}.`;
      net.fault("unknownPin", `There is no pin ${quoted(pin)}${hint === "" ? `. ${names}` : hint}`);
      good = false;
    } else if (known === null && !checkName(net, pin)) {
      good = false;
    }
    const name = net.value === null ? null : readName(net);
    if (name === null && net.value !== null) good = false;
    else pins.set(pin, name);
  }
  const given = new Set(entries.map(([pin]) => pin));
  for (const pin of allowed?.required ?? []) {
    if (given.has(pin)) continue;
    const message = `The pin "${pin}" is missing; name its net, or write null for none.`;
    place.fault("missingPin", message);
    good = false;
  }
  return { pins, good };
}
