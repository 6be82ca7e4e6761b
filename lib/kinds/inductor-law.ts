import type { Law, Site } from "./law";
import { linearLaw } from "./linear-law";
import type { Part } from "./part";
import { seriesLaw } from "./resistance-law";

/** R and L in series; the current is an unknown, so that a coil without inductance needs no other law. */
export function relayCoil(part: Part<"relayCoil">, site: Site): Law {
  const { resistance, tempco, inductance } = part.params;
  const actual = resistance * (1 + tempco * (site.temperature - 25));
  const tie = actual === 0 ? "fixesVoltage" : "conducts";
  return seriesLaw(site, [site.pin("1"), site.pin("2")], actual, inductance, tie);
}

/** v = R i + L di/dt: a short at DC but for its series resistance. */
export function inductor(part: Part<"inductor">, site: Site): Law {
  const { seriesResistance, inductance } = part.params;
  const tie = seriesResistance === 0 ? "fixesVoltage" : "conducts";
  return seriesLaw(site, [site.pin("1"), site.pin("2")], seriesResistance, inductance, tie);
}

/** M = k sqrt(L1 L2) between two inductors, dots at their first pins. */
export function coupling(part: Part<"coupling">, site: Site): Law {
  const [one, two] = site.coupled ?? [];
  if (one === undefined || two === undefined) throw new Error(`${part.path} couples no inductors`);
  const mutual = part.params.coefficient * Math.sqrt(one.inductance * two.inductance);
  return linearLaw(
    [one.current, two.current],
    [
      { row: 0, column: two.current, g: 0, c: -mutual },
      { row: 1, column: one.current, g: 0, c: -mutual },
    ],
    [],
  );
}
