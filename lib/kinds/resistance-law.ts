import type { Law, Site } from "./law";
import { linearLaw } from "./linear-law";

/** Below this part of the circuit's largest resistance a current from voltage differences is lost in rounding. */
const LOST_IN_ROUNDING = 1e-7;
/** Ω: below, always. */
const SMALL = 1;

/**
 * V = R I between two unknowns. A small resistance has its current as an unknown: as a difference of
 * nearly equal voltages the current would be wrong (1 mΩ in series with 1 GΩ: by 1e-4).
 */
export function resistanceLaw(site: Site, first: number, second: number, resistance: number): Law {
  if (resistance < SMALL || resistance < LOST_IN_ROUNDING * site.largestResistance) {
    const tie = resistance === 0 ? "fixesVoltage" : "conducts";
    return seriesLaw(site, [first, second], resistance, 0, tie);
  }
  const g = 1 / resistance;
  return linearLaw(
    [first, second],
    [
      { row: 0, column: first, g },
      { row: 0, column: second, g: -g },
      { row: 1, column: first, g: -g },
      { row: 1, column: second, g },
    ],
    [{ from: first, to: second, tie: "conducts" }],
  );
}

/** A resistance and an inductance in series, whose current is an unknown: v = R i + L di/dt. */
export function seriesLaw(
  site: Site,
  [first, second]: readonly [number, number],
  resistance: number,
  inductance: number,
  tie: "conducts" | "fixesVoltage",
): Law {
  const current = site.current();
  const law = linearLaw(
    [first, second, current],
    [
      { row: 0, column: current, g: 1 },
      { row: 1, column: current, g: -1 },
      { row: 2, column: first, g: 1 },
      { row: 2, column: second, g: -1 },
      { row: 2, column: current, g: -resistance, c: -inductance },
    ],
    [{ from: first, to: second, tie }],
  );
  const hold = (value: number): void => {
    law.q[2] = -inductance * value;
  };
  return { ...law, hold };
}
