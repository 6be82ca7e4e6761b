import { describe, expect, it } from "vitest";
import { joinPart } from "../../lib/kinds/assemble-part";
import { catalogue, kinds } from "../../lib/kinds/catalogue";
import type { Parameter } from "../../lib/kinds/parameter";
import type { Kind } from "../../lib/kinds/part";
import { stressedQuantities } from "../../lib/kinds/stressed-quantities";
import derating from "../../lib/stress/derating.json";
import { chosenPolicy } from "../../lib/stress/policy-catalogue";

const ids = derating.policies.map(({ id }) => id);
/** No current flows in the model: stress rules skip them. */
const SKIPPED: ReadonlySet<Kind> = new Set(["connector", "testPoint"]);

/** What a part of a kind can be stressed by, its thermal resistance given. */
function quantitiesOf(kind: Kind): ReadonlySet<string> {
  const params = Object.entries<Parameter>(catalogue[kind].parameters).map(([name, parameter]) => {
    if (parameter.form === "choice") return [name, parameter.words[0]];
    return [name, "default" in parameter ? parameter.default : 1];
  });
  const body = {
    path: "P1",
    pins: {},
    control: null,
    of: null,
    ratings: {},
    junctionToAmbient: 1,
    style: null,
    tolerances: {},
    drift: null,
    temperature: null,
    id: null,
    note: null,
    at: null,
    pointer: "",
  };
  const state = { pinVoltages: {}, currents: {}, power: 0, temperature: 25 };
  const own = Object.keys(
    stressedQuantities(joinPart(kind, body, Object.fromEntries(params)), state),
  );
  return new Set([...own, "ambientTemperature"]);
}

describe.each(ids)("policy %s", (id) => {
  const published = derating.policies.find((policy) => policy.id === id);
  const variants: readonly unknown[] = [
    null,
    ...(published?.rules ?? []).flatMap((rule) => ("variant" in rule ? [rule.variant] : [])),
  ];
  const rules = new Map(
    variants.flatMap((variant) =>
      chosenPolicy({ use: id, variant, rules: [] }).rules.map((rule) => [rule.id, rule] as const),
    ),
  );

  it("reads with every rule, each with an id of its own and where it comes from", () => {
    expect([...rules.keys()].sort()).toEqual(
      (published?.rules ?? []).map((rule) => rule.id).sort(),
    );
    for (const { source } of rules.values()) {
      expect(source.document).not.toBe("");
      expect(source.clause).not.toBe("");
      expect(["SEEN", "SEEN SECOND-HAND", "MEMORY", "COMMON PRACTICE"]).toContain(source.status);
    }
  });

  it("names kinds that there are, and quantities that they can be stressed by", () => {
    const unsaid = [...rules.values()].flatMap((rule) => {
      expect(rule.kinds.length).toBeGreaterThan(0);
      return rule.kinds
        .filter((kind) => !SKIPPED.has(kind) && !quantitiesOf(kind).has(rule.quantity))
        .map((kind) => `${rule.id}: ${kind} ${rule.quantity}`);
    });
    expect(unsaid).toEqual([]);
  });

  it("loses no kind on the way from the data", () => {
    const named = new Set((published?.rules ?? []).flatMap((rule) => rule.kinds));
    expect([...named].filter((kind) => !kinds.some((known) => known === kind))).toEqual([]);
  });
});
