import { describe, expect, it } from "vitest";
import { divider, resistor, source } from "./divider";
import { problemsOf } from "./problems-of";

const sheet = {
  size: "A3",
  junctions: { j1: [10, 20] },
  labels: [{ shape: "ground", net: "GND", at: [1, 2], end: { part: "V1", pin: "minus" } }],
  texts: [{ at: [0, 0], text: "Input", style: "note" }],
};
const wire = { a: { part: "R1", pin: "1" }, b: { junction: "j1" } };
const drawn = (more: Readonly<Record<string, unknown>>): unknown =>
  divider({
    blocks: {
      main: { parts: [source, resistor("R1", "IN", "GND")], wires: [wire], sheet, ...more },
    },
  });
const placed = (more: Readonly<Record<string, unknown>>): unknown =>
  divider({ blocks: { main: { parts: [source, resistor("R1", "IN", "GND", more)] } } });

const BLOCK = "/blocks/main";

describe("the drawing of a block", () => {
  it("may be whole", () => {
    expect(problemsOf(drawn({}))).toEqual([]);
    expect(problemsOf(placed({ at: [5, -5.5], turn: 3, mirror: true }))).toEqual([]);
  });

  it.each<[string, unknown, string]>([
    ["a wire to no part", [{ ...wire, a: { part: "R9", pin: "1" } }], "noSuchPart /wires/0/a/part"],
    ["a wire to no pin", [{ ...wire, a: { part: "R1", pin: "3" } }], "unknownPin /wires/0/a/pin"],
    ["a wire to no junction", [{ ...wire, b: { junction: "j2" } }], "badValue /wires/0/b/junction"],
    ["a wire of one end", [{ a: wire.a }], "missingKey /wires/0"],
    ["an end at both", [{ ...wire, b: { junction: "j1", pin: "1" } }], "unknownKey /wires/0/b/pin"],
  ])("refuses %s", (_, wires, expected) => {
    const [code, at] = expected.split(" ");
    expect(problemsOf(drawn({ wires }))).toEqual([`${code} ${BLOCK}${at}`]);
  });

  it.each<[string, unknown, string]>([
    ["a size that is none", { ...sheet, size: "A9" }, "badValue /sheet/size"],
    ["a junction nowhere", { ...sheet, junctions: { j1: [1] } }, "wrongType /sheet/junctions/j1"],
    [
      "a label of no shape",
      { ...sheet, labels: [{ ...sheet.labels[0], shape: "star" }] },
      "badValue /sheet/labels/0/shape",
    ],
    [
      "a text without style",
      { ...sheet, texts: [{ at: [0, 0], text: "" }] },
      "missingKey /sheet/texts/0",
    ],
  ])("refuses a sheet with %s", (_, given, expected) => {
    const [code, at] = expected.split(" ");
    expect(problemsOf(drawn({ sheet: given }))).toEqual([`${code} ${BLOCK}${at}`]);
  });

  it.each<[Readonly<Record<string, unknown>>, string]>([
    [{ at: [1, 2, 3] }, "wrongType /at"],
    [{ at: "here" }, "wrongType /at"],
    [{ turn: 4 }, "outOfRange /turn"],
    [{ mirror: 1 }, "wrongType /mirror"],
  ])("refuses a part placed with %j", (more, expected) => {
    const [code, at] = expected.split(" ");
    expect(problemsOf(placed(more))).toEqual([`${code} ${BLOCK}/parts/1${at}`]);
  });
});
