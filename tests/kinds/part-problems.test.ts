import { describe, expect, it } from "vitest";
import { divider, resistor, source, withParts } from "./divider";
import { problemsOf } from "./problems-of";

const r1 = (more: Readonly<Record<string, unknown>>): unknown =>
  withParts(source, resistor("R1", "IN", "GND", more));
const params = (given: Readonly<Record<string, unknown>>): unknown => r1({ params: given });
const PART = "/blocks/main/parts/1";

describe("problems of parts", () => {
  it.each<[string, unknown, readonly string[]]>([
    [
      "an unknown parameter",
      params({ resistance: 1, resistence: 1 }),
      [`unknownKey ${PART}/params/resistence`],
    ],
    ["a missing parameter", params({}), [`missingKey ${PART}/params`]],
    [
      "a value that is none",
      params({ resistance: "4k7k" }),
      [`badValue ${PART}/params/resistance`],
    ],
    ["a wrong unit", params({ resistance: "5 kV" }), [`wrongUnit ${PART}/params/resistance`]],
    [
      "a value that is a flag",
      params({ resistance: true }),
      [`wrongType ${PART}/params/resistance`],
    ],
    [
      "none where there is no none",
      params({ resistance: null }),
      [`wrongType ${PART}/params/resistance`],
    ],
    ["a negative resistance", params({ resistance: -1 }), [`outOfRange ${PART}/params/resistance`]],
    [
      "a tolerance of one",
      params({ resistance: 1, tolerance: 1 }),
      [`outOfRange ${PART}/params/tolerance`],
    ],
    [
      "an infinite value",
      params({ resistance: Number.POSITIVE_INFINITY }),
      [`badValue ${PART}/params/resistance`],
    ],
    [
      "a letter against its tolerance",
      params({ resistance: "4K7J", tolerance: "1 %" }),
      [`badValue ${PART}/params/resistance`],
    ],
    [
      "a tolerance of the first parameter",
      r1({ tolerances: { resistance: 0.1 } }),
      [`noSuchParam ${PART}/tolerances/resistance`],
    ],
    ["a rating of zero", r1({ ratings: { power: 0 } }), [`outOfRange ${PART}/ratings/power`]],
    [
      "a rating in another unit",
      r1({ ratings: { power: "5 V" } }),
      [`wrongUnit ${PART}/ratings/power`],
    ],
    [
      "a rating that measures nothing",
      r1({ ratings: { colour: 5 } }),
      [`unknownKey ${PART}/ratings/colour`],
    ],
    [
      "a thermal resistance in kelvin",
      r1({ thermal: { junctionToAmbient: "5 K" } }),
      [`wrongUnit ${PART}/thermal/junctionToAmbient`],
    ],
    ["below absolute zero", r1({ temperature: -300 }), [`outOfRange ${PART}/temperature`]],
    ["fitted with a word", r1({ fitted: "no" }), [`wrongType ${PART}/fitted`]],
    [
      "a control that is not there",
      withParts(source, {
        ref: "H1",
        kind: "ccvs",
        pins: { plus: "A", minus: "GND" },
        control: "V2",
        params: { transresistance: 1 },
      }),
      [`noSuchPart ${PART}/control`],
    ],
    [
      "a control that cannot serve",
      withParts(
        source,
        {
          ref: "H1",
          kind: "ccvs",
          pins: { plus: "A", minus: "GND" },
          control: "C1",
          params: { transresistance: 1 },
        },
        {
          ref: "C1",
          kind: "capacitor",
          pins: { "1": "IN", "2": "GND" },
          params: { capacitance: 1 },
        },
      ),
      [`badValue ${PART}/control`],
    ],
    [
      "a coupling of one coil",
      withParts(
        { ref: "L1", kind: "inductor", pins: { "1": "A", "2": "GND" }, params: { inductance: 1 } },
        { ref: "K1", kind: "coupling", of: ["L1", "L1"], params: { coefficient: 0.5 } },
      ),
      [`badValue ${PART}/of`],
    ],
    [
      "a depletion sign on the wrong channel",
      withParts(source, {
        ref: "J1",
        kind: "jfet",
        pins: { drain: "IN", gate: "GND", source: "GND" },
        params: { channel: "p", pinchOffVoltage: -4, saturatedDrainCurrent: "8 mA" },
      }),
      [`outOfRange ${PART}/params/pinchOffVoltage`],
    ],
    [
      "a polarity that is none",
      withParts({
        ref: "Q1",
        kind: "bjt",
        pins: { collector: "A", base: "B", emitter: "C" },
        params: { polarity: "NPN" },
      }),
      ["badValue /blocks/main/parts/0/params/polarity"],
    ],
    [
      "a fit beside its number",
      withParts({
        ref: "D1",
        kind: "diode",
        pins: { anode: "A", cathode: "GND" },
        params: { saturationCurrent: 1e-9 },
        fit: [
          { current: 1e-3, voltage: 0.6 },
          { current: 1e-2, voltage: 0.7 },
        ],
      }),
      ["badValue /blocks/main/parts/0/params/saturationCurrent"],
    ],
    [
      "a fit of one point",
      withParts({
        ref: "D1",
        kind: "diode",
        pins: { anode: "A", cathode: "GND" },
        fit: [{ current: 1e-3, voltage: 0.6 }],
      }),
      ["badValue /blocks/main/parts/0/fit"],
    ],
    ["half a surrogate pair", divider({ title: "\uD800" }), ["badValue /title"]],
    ["a function", divider({ policy: { variant: () => 1 } }), ["wrongType /policy/variant"]],
  ])("%s", (_, file, expected) => {
    expect(problemsOf(file)).toEqual(expected);
  });
});
