import { describe, expect, it } from "vitest";
import { divider, resistor, source, withParts } from "./divider";
import { problemsOf } from "./problems-of";

const PART = "/blocks/main/parts/1";
const r1 = (more: Readonly<Record<string, unknown>>): unknown =>
  withParts(source, resistor("R1", "IN", "GND", more));

describe("problems of structure", () => {
  it.each<[string, unknown, readonly string[]]>([
    ["no object", [], ["wrongType "]],
    ["nothing in it", {}, ["missingKey ", "missingKey "]],
    ["another version", divider({ ampersign: 2 }), ["badValue /ampersign"]],
    ["an unknown key", divider({ limit: [] }), ["unknownKey /limit"]],
    ["a key to be escaped", divider({ "a/b~c": 1 }), ["unknownKey /a~1b~0c"]],
    ["a title that is a number", divider({ title: 5 }), ["wrongType /title"]],
    ["a reference with a dot", divider({ reference: "G.ND" }), ["badValue /reference"]],
    ["no block", divider({ blocks: {} }), ["badValue /blocks"]],
    ["a top that is none", divider({ top: "mian" }), ["noSuchBlock /top"]],
    [
      "two blocks and no top",
      divider({ blocks: { a: { parts: [] }, b: { parts: [] } } }),
      ["missingKey "],
    ],
    ["no parts", divider({ blocks: { main: {} } }), ["missingKey /blocks/main"]],
    ["a part that is a text", withParts(source, "R1"), ["wrongType /blocks/main/parts/1"]],
    ["no ref", r1({ ref: undefined }), ["wrongType /blocks/main/parts/1/ref"]],
    ["a ref with a slash", r1({ ref: "R/1" }), [`badValue ${PART}/ref`]],
    ["an empty ref", r1({ ref: "" }), [`badValue ${PART}/ref`]],
    ["an unknown kind", r1({ kind: "resitor" }), [`unknownKind ${PART}/kind`]],
    ["the name of a method for a kind", r1({ kind: "toString" }), [`unknownKind ${PART}/kind`]],
    ["a key of another kind", r1({ control: "V1" }), [`unknownKey ${PART}/control`]],
    [
      "an unknown pin",
      r1({ pins: { "1": "IN", "2": "GND", "3": "GND" } }),
      [`unknownPin ${PART}/pins/3`],
    ],
    ["a missing pin", r1({ pins: { "1": "IN" } }), [`missingPin ${PART}/pins`]],
    [
      "no pins",
      withParts({ ref: "R1", kind: "resistor", params: { resistance: 1 } }),
      ["missingKey /blocks/main/parts/0"],
    ],
    ["a net that is a number", r1({ pins: { "1": 1, "2": "GND" } }), [`wrongType ${PART}/pins/1`]],
    [
      "a net with a control character",
      r1({ pins: { "1": "A\u0007", "2": "GND" } }),
      [`badValue ${PART}/pins/1`],
    ],
    [
      "the same ref twice",
      withParts(source, resistor("V1", "IN", "GND")),
      [`duplicateRef ${PART}/ref`],
    ],
    [
      "the same id twice",
      withParts(resistor("R1", "A", "B", { id: "x" }), resistor("R2", "A", "B", { id: "x" })),
      [`duplicateName ${PART}/id`],
    ],
  ])("%s", (_, file, expected) => {
    expect(problemsOf(file)).toEqual(expected);
  });
});
