import { checkHeading, readName } from "../circuit/names";
import type { Place } from "../circuit/place";
import { meaning } from "../values/nearest-word";
import { quoted } from "../values/read-value";

/** What pins a part must have, and which more it may have. */
export interface AllowedPins {
  readonly required: readonly string[];
  readonly optional: readonly string[] | "any";
}

export interface ReadPins {
  /** The net of each pin; null: on no net. */
  readonly pins: ReadonlyMap<string, string | null>;
  /** Whether every net could be made out, wrong pins or not. */
  readonly clear: boolean;
  readonly good: boolean;
}

/** Reads the pins of a part. What could be read comes back even where something is wrong. */
export function readPins(part: Place, place: Place | null, allowed: AllowedPins): ReadPins {
  const pins = new Map<string, string | null>();
  if (place === null) {
    const needed = allowed.required.length > 0;
    if (needed) part.fault("missingKey", 'The key "pins" is missing here; add it.');
    return { pins, clear: !needed, good: !needed };
  }
  const entries = place.entries();
  if (entries === null) return { pins, clear: false, good: false };
  let known = true;
  for (const [pin, net] of entries) {
    known = isKnown(pin, net, allowed) && known;
    const name = net.value === null ? null : readName(net);
    if (name !== null || net.value === null) pins.set(pin, name);
  }
  const clear = pins.size === entries.length;
  const complete = checkComplete(place, new Set(entries.map(([pin]) => pin)), allowed);
  return { pins, clear, good: clear && known && complete };
}

function isKnown(pin: string, place: Place, { required, optional }: AllowedPins): boolean {
  if (optional === "any") return checkHeading(place, pin);
  const known = [...required, ...optional];
  if (known.includes(pin)) return true;
  const hint = meaning(pin, known);
  const names = known.length === 0 ? "It has none." : `Its pins are ${known.join(", ")}.`;
  const end = hint === "." ? `. ${names}` : hint;
  place.fault("unknownPin", `There is no pin ${quoted(pin)}${end}`);
  return false;
}

function checkComplete(place: Place, given: ReadonlySet<string>, allowed: AllowedPins): boolean {
  const missing = allowed.required.filter((pin) => !given.has(pin));
  for (const pin of missing) {
    const message = `The pin "${pin}" is missing; name its net, or write null for none.`;
    place.fault("missingPin", message);
  }
  return missing.length === 0;
}
