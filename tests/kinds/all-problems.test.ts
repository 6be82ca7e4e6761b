import { describe, expect, it } from "vitest";
import { readCircuit, readCircuitFile } from "../../lib/kinds/read-circuit";
import { resistor, source, withParts } from "./divider";

const r1 = (more: Readonly<Record<string, unknown>>): unknown =>
  withParts(source, resistor("R1", "IN", "GND", more));
const params = (given: Readonly<Record<string, unknown>>): unknown => r1({ params: given });

describe("the problems of a file", () => {
  it("tells all problems at once, each a sentence", () => {
    const read = readCircuitFile({
      ampersign: 1,
      colour: "red",
      blocks: {
        main: {
          parts: [
            { ref: "R1", kind: "resistor", pins: { "1": "A" }, params: { resistance: "5 kV" } },
            {
              ref: "R1",
              kind: "resistor",
              pins: { "1": "A", "2": "GND" },
              params: { resistance: -5 },
            },
            { ref: "Z1", kind: "flux" },
          ],
        },
      },
      conditions: [{ name: "Hot", ambient: "hot" }, { name: "Hot" }],
      limits: [{ net: "A", min: "1 V", condition: "Cold" }],
      policy: { use: "ours" },
    });
    const found = read.ok ? [] : read.error;
    expect(found.map(({ code }) => code).sort()).toEqual(
      [
        "badValue",
        "badValue",
        "badValue",
        "duplicateName",
        "duplicateRef",
        "missingPin",
        "outOfRange",
        "unknownKey",
        "unknownKind",
        "wrongUnit",
      ].sort(),
    );
    for (const { message } of found) expect(message).toMatch(/^[A-Z"].*[.?]$/);
  });

  it("suggests the word that was meant", () => {
    const read = readCircuitFile(params({ resistence: 1 }));
    const [first] = read.ok ? [] : read.error;
    expect(first?.message).toContain('did you mean "resistance"?');
  });

  it("goes on after keys that stand twice", () => {
    const read = readCircuit('{"ampersign":1,"ampersign":1,"blocks":{"main":{"parts":[]}},"x":1}');
    const found = read.ok ? [] : read.error;
    expect(found.map(({ code, at }) => `${code} ${at}`)).toEqual([
      "duplicateKey /ampersign",
      "unknownKey /x",
    ]);
  });
});
