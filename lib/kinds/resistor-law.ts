import type { Law, Site } from "./law";
import type { Part } from "./part";
import { resistanceLaw } from "./resistance-law";

/** degrees Celsius that resistances are stated at */
const STATED_AT = 25;

/** V = R I, with R = R25 (1 + tempco (T - 25 °C)). */
export function resistor(part: Part<"resistor">, site: Site): Law {
  const { resistance, tempco } = part.params;
  const actual = resistance * (1 + tempco * (site.temperature - STATED_AT));
  return resistanceLaw(site, site.pin("1"), site.pin("2"), actual);
}

/** R = R25 exp(B (1/T - 1/298.15 K)). */
export function thermistor(part: Part<"thermistor">, site: Site): Law {
  const { resistance25, beta } = part.params;
  const kelvin = site.temperature + 273.15;
  const actual = resistance25 * Math.exp(beta * (1 / kelvin - 1 / 298.15));
  return resistanceLaw(site, site.pin("1"), site.pin("2"), actual);
}

/** A resistor with a current rating. */
export function fuse(part: Part<"fuse">, site: Site): Law {
  return resistanceLaw(site, site.pin("1"), site.pin("2"), part.params.resistance);
}
