import { emptyLaw, type Law, Places, type Site, type Stage } from "./law";
import type { Part } from "./part";

/** Below this part of the rated voltage the lamp is a resistor: the power law has no slope at zero. */
const LINEAR_BELOW = 1e-6;

/** I = I0 (|V| / V0)^exponent, odd, with I0 = ratedPower / ratedVoltage. */
export function lamp(part: Part<"lamp">, site: Site): Law {
  const { ratedVoltage, ratedPower, exponent } = part.params;
  const [first, second] = [site.pin("1"), site.pin("2")];
  const places = new Places();
  for (const row of [first, second]) for (const column of [first, second]) places.add(row, column);
  const law = emptyLaw([first, second], places);
  const { f, g } = law;
  const rated = ratedPower / ratedVoltage;
  const evaluate = (x: Float64Array, _at: Stage): void => {
    const v = (x[first] ?? 0) - (x[second] ?? 0);
    const ratio = Math.max(Math.abs(v) / ratedVoltage, LINEAR_BELOW);
    const linear = Math.abs(v) < LINEAR_BELOW * ratedVoltage;
    const size = rated * ratio ** exponent;
    f[0] = linear ? (size * v) / (ratio * ratedVoltage) : Math.sign(v) * size;
    f[1] = -f[0];
    const slope = ((linear ? 1 : exponent) * size) / (ratio * ratedVoltage);
    g.set([slope, -slope, -slope, slope]);
  };
  return { ...law, evaluate, paths: [{ from: first, to: second, tie: "conducts" }] };
}
