import { describe, expect, it } from "vitest";
import { readCircuitFile } from "../../lib/kinds/read-circuit";
import { divider } from "./divider";
import { problemsOf } from "./problems-of";

const rule = {
  id: "ours-power",
  kinds: ["resistor"],
  quantity: "power",
  form: "ratio",
  rating: "power",
  points: [
    [70, 0.5],
    [125, 0],
  ],
};
const ruled = (...rules: readonly unknown[]): unknown => divider({ policy: { rules } });

describe("the policy", () => {
  it("keeps added rules as written", () => {
    const read = readCircuitFile(divider({ policy: { use: "rac-benign", rules: [rule] } }));
    expect(read.ok && read.value.policy).toEqual({
      use: "rac-benign",
      variant: null,
      rules: [rule],
    });
  });

  it.each<[string, unknown, readonly string[]]>([
    ["no id", { ...rule, id: 5 }, ["wrongType /policy/rules/0/id"]],
    ["an unknown key", { ...rule, colour: 1 }, ["unknownKey /policy/rules/0/colour"]],
    ["an unknown kind", { ...rule, kinds: ["resitor"] }, ["unknownKind /policy/rules/0/kinds/0"]],
    ["an unknown form", { ...rule, form: "half" }, ["badValue /policy/rules/0/form"]],
    ["no points", { ...rule, points: [] }, ["badValue /policy/rules/0/points"]],
    ["a point of one", { ...rule, points: [[70]] }, ["wrongType /policy/rules/0/points/0"]],
    [
      "temperatures that fall",
      {
        ...rule,
        points: [
          [70, 1],
          [60, 1],
        ],
      },
      ["outOfRange /policy/rules/0/points/1"],
    ],
    ["a ceiling without value", { ...rule, form: "ceiling" }, ["missingKey /policy/rules/0"]],
    [
      "a term of no form",
      { ...rule, form: "lowerOf", terms: [{ rating: "power" }] },
      ["missingKey /policy/rules/0/terms/0"],
    ],
    [
      "a band of words",
      { ...rule, form: "band", band: ["a", 1] },
      ["wrongType /policy/rules/0/band/0"],
    ],
  ])("refuses a rule with %s", (_, given, expected) => {
    expect(problemsOf(ruled(given))).toEqual(expected);
  });

  it("refuses two rules of one id", () => {
    expect(problemsOf(ruled(rule, rule))).toEqual(["duplicateName /policy/rules/1/id"]);
  });
});
