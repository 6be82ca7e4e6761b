import type { DirectPath, Law, Site } from "./law";
import { linearLaw } from "./linear-law";
import type { Part } from "./part";

/** i = C dv/dt, the leakage beside the capacitance, the series resistance before both. */
export function capacitor(part: Part<"capacitor">, site: Site): Law {
  const { capacitance, seriesResistance, leakageResistance } = part.params;
  const [first, second] = [site.pin("1"), site.pin("2")];
  const leakage = leakageResistance === null ? 0 : 1 / leakageResistance;
  const paths: readonly DirectPath[] =
    leakageResistance === null ? [] : [{ from: first, to: second, tie: "conducts" }];
  const law =
    seriesResistance === 0
      ? plain(first, second, leakage, capacitance)
      : inSeries(site, first, second, seriesResistance, leakage, capacitance);
  const hold = (value: number): void => {
    law.q.fill(0);
    if (seriesResistance === 0) {
      law.q[0] = capacitance * value;
      law.q[1] = -capacitance * value;
    } else {
      law.q[3] = capacitance * value;
    }
  };
  return { ...law, paths, hold };
}

function plain(first: number, second: number, g: number, c: number): Law {
  return linearLaw(
    [first, second],
    [
      { row: 0, column: first, g, c },
      { row: 0, column: second, g: -g, c: -c },
      { row: 1, column: first, g: -g, c: -c },
      { row: 1, column: second, g, c },
    ],
    [],
  );
}

/** With the current and the voltage behind the resistance as unknowns: no difference of nearly equal voltages. */
function inSeries(
  site: Site,
  first: number,
  second: number,
  resistance: number,
  leakage: number,
  capacitance: number,
): Law {
  const current = site.current();
  const inner = site.inner();
  return linearLaw(
    [first, second, current, inner],
    [
      { row: 0, column: current, g: 1 },
      { row: 1, column: current, g: -1 },
      { row: 2, column: first, g: 1 },
      { row: 2, column: second, g: -1 },
      { row: 2, column: current, g: -resistance },
      { row: 2, column: inner, g: -1 },
      { row: 3, column: current, g: -1 },
      { row: 3, column: inner, g: leakage, c: capacitance },
    ],
    [],
  );
}
