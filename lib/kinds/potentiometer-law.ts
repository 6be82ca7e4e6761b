import { joinLaws } from "./join-laws";
import type { Law, Site } from "./law";
import type { Part } from "./part";
import { resistanceLaw } from "./resistance-law";

/** Two resistors that share the wiper; at position 0 the wiper stands at pin 1. */
export function potentiometer(part: Part<"potentiometer">, site: Site): Law {
  const { resistance, position } = part.params;
  const [first, wiper, second] = [site.pin("1"), site.pin("wiper"), site.pin("2")];
  return joinLaws(
    [first, wiper, second],
    [
      resistanceLaw(site, first, wiper, resistance * position),
      resistanceLaw(site, wiper, second, resistance * (1 - position)),
    ],
  );
}
