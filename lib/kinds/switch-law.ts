import { emptyLaw, type Law, Places, type Site, type Stage } from "./law";
import type { Part } from "./part";
import { waveformValue } from "./waveform-value";

/** A waveform above this closes the switch. */
export const CLOSED_ABOVE = 0.5;

/** A resistance of two values; its current is an unknown, for the closed one is small. */
export function switchLaw(part: Part<"switch">, site: Site): Law {
  const { closed, closedResistance, openResistance, waveform } = part.params;
  const [first, second, current] = [site.pin("1"), site.pin("2"), site.current()];
  const places = new Places();
  places.add(first, current);
  places.add(second, current);
  places.add(current, first);
  places.add(current, second);
  places.add(current, current);
  const law = emptyLaw([first, second, current], places);
  const { f, g } = law;
  const evaluate = (x: Float64Array, at: Stage): void => {
    const isClosed =
      at.time === null || waveform === null
        ? closed
        : waveformValue(waveform, at.time) > CLOSED_ABOVE;
    const resistance = isClosed ? closedResistance : openResistance;
    // The row is divided by the resistance where that is large, to keep its entries near 1.
    const scale = 1 / Math.max(1, resistance);
    const i = x[current] ?? 0;
    f[0] = i;
    f[1] = -i;
    f[2] = ((x[first] ?? 0) - (x[second] ?? 0)) * scale - resistance * scale * i;
    g[0] = 1;
    g[1] = -1;
    g[2] = scale;
    g[3] = -scale;
    g[4] = -resistance * scale;
  };
  return { ...law, linear: true, evaluate, paths: [{ from: first, to: second, tie: "conducts" }] };
}
