import type { Law, Site } from "./law";
import { linearLaw } from "./linear-law";
import type { Part } from "./part";

/**
 * Coupled inductors, from the ideal ratio n (primary to secondary): Lp = Lleak + Lm, Ls = Lm / n²,
 * M = Lm / n; dots at primary1 and secondary1.
 */
export function transformer(part: Part<"transformer">, site: Site): Law {
  const { turnsRatio, magnetisingInductance, leakageInductance } = part.params;
  const { primaryResistance, secondaryResistance } = part.params;
  const [p1, p2] = [site.pin("primary1"), site.pin("primary2")];
  const [s1, s2] = [site.pin("secondary1"), site.pin("secondary2")];
  const [primary, secondary] = [site.current(), site.current()];
  const mutual = magnetisingInductance / turnsRatio;
  const tie = (resistance: number) => (resistance === 0 ? "fixesVoltage" : "conducts");
  return linearLaw(
    [p1, p2, s1, s2, primary, secondary],
    [
      { row: 0, column: primary, g: 1 },
      { row: 1, column: primary, g: -1 },
      { row: 2, column: secondary, g: 1 },
      { row: 3, column: secondary, g: -1 },
      { row: 4, column: p1, g: 1 },
      { row: 4, column: p2, g: -1 },
      {
        row: 4,
        column: primary,
        g: -primaryResistance,
        c: -(leakageInductance + magnetisingInductance),
      },
      { row: 4, column: secondary, g: 0, c: -mutual },
      { row: 5, column: s1, g: 1 },
      { row: 5, column: s2, g: -1 },
      { row: 5, column: secondary, g: -secondaryResistance, c: -mutual / turnsRatio },
      { row: 5, column: primary, g: 0, c: -mutual },
    ],
    [
      { from: p1, to: p2, tie: tie(primaryResistance) },
      { from: s1, to: s2, tie: tie(secondaryResistance) },
    ],
  );
}
