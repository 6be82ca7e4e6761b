import { describe, expect, it } from "vitest";
import { divider } from "./divider";
import { problemsOf } from "./problems-of";

const condition = (given: Readonly<Record<string, unknown>>): unknown =>
  divider({ conditions: [{ name: "A", ...given }] });

describe("problems of conditions and limits", () => {
  it.each<[string, unknown, readonly string[]]>([
    ["a condition without a name", divider({ conditions: [{}] }), ["missingKey /conditions/0"]],
    [
      "two conditions of one name",
      divider({ conditions: [{ name: "A" }, { name: "A" }] }),
      ["duplicateName /conditions/1/name"],
    ],
    [
      "an ambient at absolute zero",
      condition({ ambient: -273.15 }),
      ["outOfRange /conditions/0/ambient"],
    ],
    [
      "a set of no part",
      condition({ set: { "R9.resistance": 1 } }),
      ["noSuchPart /conditions/0/set/R9.resistance"],
    ],
    [
      "a set of no parameter",
      condition({ set: { "R1.gain": 1 } }),
      ["noSuchParam /conditions/0/set/R1.gain"],
    ],
    [
      "a set that is no address",
      condition({ set: { "R1.a.b": 1 } }),
      ["badValue /conditions/0/set/R1.a.b"],
    ],
    [
      "a set out of range",
      condition({ set: { "R1.resistance": -1 } }),
      ["outOfRange /conditions/0/set/R1.resistance"],
    ],
    ["a set that is a list", condition({ set: [] }), ["wrongType /conditions/0/set"]],
    [
      "an analysis without a type",
      condition({ analysis: {} }),
      ["missingKey /conditions/0/analysis"],
    ],
    [
      "an unknown analysis",
      condition({ analysis: { type: "noise" } }),
      ["badValue /conditions/0/analysis/type"],
    ],
    [
      "a sweep of one point",
      condition({ analysis: { type: "sweep", of: "V1.dc", from: 0, to: 1, points: 1 } }),
      ["outOfRange /conditions/0/analysis/points"],
    ],
    [
      "a sweep of half a point",
      condition({ analysis: { type: "sweep", of: "V1.dc", from: 0, to: 1, points: 2.5 } }),
      ["badValue /conditions/0/analysis/points"],
    ],
    [
      "a sweep of nothing",
      condition({ analysis: { type: "sweep", of: "V2.dc", from: 0, to: 1, points: 2 } }),
      ["noSuchPart /conditions/0/analysis/of"],
    ],
    [
      "a sweep out of range",
      condition({ analysis: { type: "sweep", of: "R1.resistance", from: -1, to: 1, points: 2 } }),
      ["outOfRange /conditions/0/analysis/from"],
    ],
    [
      "frequencies that fall",
      condition({ analysis: { type: "frequencyResponse", from: 10, to: 1, pointsPerDecade: 10 } }),
      ["outOfRange /conditions/0/analysis/from"],
    ],
    [
      "a transient of no time",
      condition({ analysis: { type: "transient", until: 0 } }),
      ["outOfRange /conditions/0/analysis/until"],
    ],
    [
      "a record of no net",
      condition({ analysis: { type: "transient", until: 1, record: ["OUT", "OTU"] } }),
      ["noSuchNet /conditions/0/analysis/record/1"],
    ],
    [
      "an initial that is no state",
      condition({ analysis: { type: "transient", until: 1, initial: { "R1.voltage": 1 } } }),
      ["noSuchParam /conditions/0/analysis/initial/R1.voltage"],
    ],
    [
      "a start at no net",
      condition({ start: { nets: { Q: 5 } } }),
      ["noSuchNet /conditions/0/start/nets/Q"],
    ],
    [
      "an unknown method",
      condition({ spread: { method: "guess" } }),
      ["badValue /conditions/0/spread/method"],
    ],
    ["an unknown policy", divider({ policy: { use: "none" } }), ["badValue /policy/use"]],
    ["a limit of no net", divider({ limits: [{ net: "X", min: 1 }] }), ["noSuchNet /limits/0/net"]],
    [
      "a limit of no part",
      divider({ limits: [{ part: "R9", quantity: "power", max: 1 }] }),
      ["noSuchPart /limits/0/part"],
    ],
    ["a limit without bounds", divider({ limits: [{ net: "OUT" }] }), ["missingKey /limits/0"]],
    ["a limit of nothing", divider({ limits: [{ min: 1 }] }), ["missingKey /limits/0"]],
    [
      "a limit of two things",
      divider({ limits: [{ net: "OUT", part: "R1", quantity: "power", min: 1 }] }),
      ["badValue /limits/0"],
    ],
    [
      "a limit between one net",
      divider({ limits: [{ between: ["OUT"], min: 1 }] }),
      ["wrongType /limits/0/between"],
    ],
    [
      "a limit in no condition",
      divider({ limits: [{ net: "OUT", min: 1, condition: "Hot" }] }),
      ["badValue /limits/0/condition"],
    ],
    [
      "a limit nothing can meet",
      divider({ limits: [{ net: "OUT", min: 2, max: 1 }] }),
      ["outOfRange /limits/0"],
    ],
    [
      "a limit in another unit",
      divider({ limits: [{ net: "OUT", min: "1 A" }] }),
      ["wrongUnit /limits/0/min"],
    ],
  ])("%s", (_, file, expected) => {
    expect(problemsOf(file)).toEqual(expected);
  });
});
