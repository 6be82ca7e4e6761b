import { describe, expect, it } from "vitest";
import { divider, resistor, source } from "./divider";
import { problemsOf } from "./problems-of";

const used = (pins: Readonly<Record<string, unknown>>, more = {}): unknown =>
  divider({
    top: "main",
    blocks: {
      main: { parts: [source, { ref: "X1", kind: "block", block: "tee", pins, ...more }] },
      tee: { ports: ["IN", "GND"], parts: [resistor("R1", "IN", "GND")] },
    },
  });
const PART = "/blocks/main/parts/1";

describe("problems of blocks", () => {
  it.each<[string, unknown, readonly string[]]>([
    ["a block that is not there", used({}, { block: "tea" }), [`noSuchBlock ${PART}/block`]],
    ["a pin that is no port", used({ OUT: "IN" }), [`unknownPin ${PART}/pins/OUT`]],
    [
      "the reference joined elsewhere",
      used({ IN: "IN", GND: "IN" }),
      [`badValue ${PART}/pins/GND`],
    ],
    [
      "a set of a part not there",
      used({}, { set: { "R9.resistance": 1 } }),
      [`noSuchPart ${PART}/set/R9.resistance`],
    ],
    [
      "a set of a parameter not there",
      used({}, { set: { "R1.gain": 1 } }),
      [`noSuchParam ${PART}/set/R1.gain`],
    ],
    ["a set without a dot", used({}, { set: { R1: 1 } }), [`badValue ${PART}/set/R1`]],
    ["a parameter on a use", used({}, { params: {} }), [`unknownKey ${PART}/params`]],
    [
      "a block in itself",
      divider({ blocks: { main: { parts: [{ ref: "X1", kind: "block", block: "main" }] } } }),
      ["blockContainsItself /blocks/main/parts/0/block"],
    ],
    [
      "blocks in each other",
      divider({
        top: "a",
        blocks: {
          a: { parts: [{ ref: "X", kind: "block", block: "b" }] },
          b: { parts: [{ ref: "X", kind: "block", block: "a" }] },
        },
      }),
      ["blockContainsItself /blocks/b/parts/0/block"],
    ],
    [
      "a port listed twice",
      divider({ blocks: { main: { ports: ["A", "A"], parts: [] } } }),
      ["duplicateName /blocks/main/ports/1"],
    ],
  ])("%s", (_, file, expected) => {
    expect(problemsOf(file)).toEqual(expected);
  });

  it("refuses blocks that multiply beyond measure, without building them", () => {
    const blocks = Object.fromEntries(
      Array.from({ length: 40 }, (_, level) => [
        `b${level}`,
        {
          parts:
            level === 39
              ? [resistor("R1", "A", "GND")]
              : ["X1", "X2"].map((ref) => ({ ref, kind: "block", block: `b${level + 1}` })),
        },
      ]),
    );
    expect(problemsOf({ ampersign: 1, top: "b0", blocks })).toEqual(["tooLarge /blocks/b0"]);
  });

  it("refuses blocks nested too deep, from whichever end they are read", () => {
    const chain = Array.from({ length: 400 }, (_, level) => [
      `b${level}`,
      {
        parts:
          level === 399
            ? [resistor("R1", "A", "GND")]
            : [{ ref: "X", kind: "block", block: `b${level + 1}` }],
      },
    ]);
    for (const order of [chain, chain.toReversed()]) {
      const found = problemsOf({ ampersign: 1, top: "b0", blocks: Object.fromEntries(order) });
      expect(found[0]).toMatch(/^tooLarge /);
    }
  });
});
