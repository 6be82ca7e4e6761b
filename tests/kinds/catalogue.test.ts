import { describe, expect, it } from "vitest";
import { catalogue, kinds, parameterOf } from "../../lib/kinds/catalogue";
import type { Parameter } from "../../lib/kinds/parameter";
import type { Kind } from "../../lib/kinds/part";
import { readCircuitFile } from "../../lib/kinds/read-circuit";
import { within } from "../../lib/values/range";
import { withParts } from "./divider";

const parametersOf = (kind: Kind): readonly (readonly [string, Parameter])[] =>
  Object.entries<Parameter>(catalogue[kind].parameters);

/** A value for each parameter that must be given. */
function needed(kind: Kind): Readonly<Record<string, unknown>> {
  const given = new Map<string, string | number | undefined>();
  for (const [name, parameter] of parametersOf(kind)) {
    if (parameter.form === "choice") given.set(name, parameter.words[0]);
    if (parameter.form === "quantity" && parameter.default === undefined) given.set(name, 0.5);
  }
  const signs = kind === "jfet" ? { pinchOffVoltage: -2 } : {};
  return { ...Object.fromEntries(given), ...signs };
}

const coil = (ref: string): unknown => ({
  ref,
  kind: "inductor",
  pins: { "1": "A", "2": "B" },
  params: { inductance: "1 mH" },
});

/** The least that makes a part of the kind. */
function least(kind: Kind): Readonly<Record<string, unknown>> {
  const { pins, optionalPins = [], refersTo } = catalogue[kind];
  const names = pins === "any" ? [] : pins.filter((pin) => !optionalPins.includes(pin));
  const references = { control: { control: "L1" }, of: { of: ["L1", "L2"] }, none: {} };
  return {
    ref: "P1",
    kind,
    pins: Object.fromEntries(names.map((pin) => [pin, null])),
    params: needed(kind),
    ...references[refersTo ?? "none"],
  };
}

describe.each(kinds)("the kind %s", (kind) => {
  it("reads from its needed parameters alone, defaults filled in", () => {
    const read = readCircuitFile(withParts(coil("L1"), coil("L2"), least(kind)));
    expect(read.ok ? [] : read.error).toEqual([]);
    const params = read.ok ? (read.value.parts[2]?.params ?? {}) : {};
    expect(Object.keys(params)).toEqual(parametersOf(kind).map(([name]) => name));
    for (const [name, parameter] of parametersOf(kind)) {
      if (parameter.form === "choice" || parameter.default === undefined) continue;
      expect(new Map<string, unknown>(Object.entries(params)).get(name)).toBe(parameter.default);
    }
  });

  it("has defaults within their own ranges", () => {
    const outside = parametersOf(kind).filter(
      ([, parameter]) =>
        parameter.form === "quantity" &&
        typeof parameter.default === "number" &&
        !within(parameter.range, parameter.default),
    );
    expect(outside).toEqual([]);
  });

  it("misses each needed parameter by name", () => {
    const given = needed(kind);
    const told = Object.keys(given).map((name) => {
      const params = Object.fromEntries(Object.entries(given).filter(([key]) => key !== name));
      const read = readCircuitFile(withParts(coil("L1"), coil("L2"), { ...least(kind), params }));
      return read.ok ? null : read.error.map(({ code, message }) => [code, message.includes(name)]);
    });
    expect(told).toEqual(Object.keys(given).map(() => [["missingKey", true]]));
  });
});

describe("the catalogue", () => {
  it("finds a parameter by its own name alone", () => {
    expect(parameterOf("resistor", "resistance")?.form).toBe("quantity");
    expect(parameterOf("resistor", "constructor")).toBeUndefined();
  });
});
