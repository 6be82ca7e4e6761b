import { describe, expect, it } from "vitest";
import { resistor, source, withParts } from "./divider";
import { problemsOf } from "./problems-of";

const waveform = (given: unknown): unknown =>
  withParts({ ...source, params: { waveform: given } }, resistor("R1", "IN", "GND"));
const WAVE = "/blocks/main/parts/0/params/waveform";

describe("problems of waveforms", () => {
  it.each<[string, unknown, string]>([
    ["two shapes", { step: {}, sine: {} }, `badValue ${WAVE}`],
    ["no shape", {}, `missingKey ${WAVE}`],
    ["a pulse without high", { pulse: { low: 0 } }, `missingKey ${WAVE}/pulse`],
    [
      "a period too short",
      { pulse: { low: 0, high: 1, rise: 1, width: 1, fall: 1, period: 2.9 } },
      `outOfRange ${WAVE}/pulse/period`,
    ],
    [
      "a period without width",
      { pulse: { low: 0, high: 1, period: 1 } },
      `outOfRange ${WAVE}/pulse/period`,
    ],
    [
      "a sine of no frequency",
      { sine: { amplitude: 1, frequency: 0 } },
      `outOfRange ${WAVE}/sine/frequency`,
    ],
    [
      "points that do not rise",
      {
        points: [
          [0, 0],
          [0, 1],
        ],
      },
      `outOfRange ${WAVE}/points/1`,
    ],
    ["no points", { points: [] }, `badValue ${WAVE}/points`],
    ["a step in seconds", { step: { from: "1 s", to: 1, at: 0 } }, `wrongUnit ${WAVE}/step/from`],
  ])("a waveform with %s", (_, given, expected) => {
    expect(problemsOf(waveform(given))).toEqual([expected]);
  });
});
