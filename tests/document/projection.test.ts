import { readFileSync } from "node:fs";
import { expect, it } from "vitest";
import * as Y from "yjs";
import type { CircuitFile } from "../../lib/circuit/circuit-file";
import { writeCircuitFile } from "../../lib/document/from-circuit-file";
import { project } from "../../lib/document/projection";
import { topLevel } from "../../lib/document/shape";
import { readCircuitFile } from "../../lib/kinds/read-circuit";

const divider: CircuitFile = {
  ampersign: 1,
  reference: "GND",
  top: "main",
  blocks: {
    main: {
      ports: [],
      parts: [
        {
          ref: "V1",
          kind: "voltageSource",
          pins: { plus: "IN", minus: "GND" },
          params: { dc: "24 V" },
        },
        {
          ref: "R1",
          kind: "resistor",
          pins: { "1": "IN", "2": "OUT" },
          params: { resistance: "4k7" },
        },
        {
          ref: "R2",
          kind: "resistor",
          pins: { "1": "OUT", "2": "GND" },
          params: { resistance: "2k2" },
        },
      ],
    },
  },
};

function written(file: CircuitFile): Y.Doc {
  const doc = new Y.Doc();
  let made = 0;
  writeCircuitFile(doc, file, () => `id${made++}`);
  return doc;
}

function circuitOf(file: unknown) {
  const read = readCircuitFile(file);
  if (!read.ok) throw new Error(JSON.stringify(read.error));
  return read.value;
}

it("gives a circuit file back with every net, part and value", () => {
  const doc = written(divider);
  const { file, problems } = project(doc);
  expect(problems).toEqual([]);
  const [was, is] = [circuitOf(divider), circuitOf(file)];
  expect(is.nets).toEqual(was.nets);
  expect(is.parts.map(({ path }) => path).sort()).toEqual(was.parts.map(({ path }) => path).sort());
});

it("gives the same bytes for the same state, whatever the order of merging", () => {
  const doc = written(divider);
  const seed = Y.encodeStateAsUpdate(doc);
  const updates = ["R3", "R4", "R5"].map((designator) => {
    const page = new Y.Doc();
    Y.applyUpdate(page, seed);
    const before = Y.encodeStateVector(page);
    const part = new Y.Map<unknown>([
      ["block", "main"],
      ["kind", "resistor"],
      // Two people take the same number.
      ["designator", designator === "R5" ? "R4" : designator],
      ["born", 9],
      ["at", [1, 1, 0, false]],
      ["params", new Y.Map([["resistance", "1k"]])],
    ]);
    topLevel(page, "parts").set(designator, part);
    return Y.encodeStateAsUpdate(page, before);
  });
  const seen = new Set<string>();
  for (const order of [
    updates,
    updates.toReversed(),
    [...updates.slice(1), ...updates.slice(0, 1)],
  ]) {
    const merged = new Y.Doc();
    for (const update of [seed, ...order]) Y.applyUpdate(merged, update);
    const { file, problems } = project(merged);
    expect(problems.map(({ code }) => code)).toContain("designatorTwice");
    seen.add(JSON.stringify([file, problems]));
  }
  expect(seen.size).toBe(1);
});

it("keeps the electrical digest of a drawn board", () => {
  for (const letter of ["A", "B", "C"]) {
    const text = readFileSync(`prisma/demo/ffc-2-${letter}.json`, "utf8");
    const file: CircuitFile = JSON.parse(text);
    const back = project(written(file));
    expect(back.problems).toEqual([]);
    expect(circuitOf(back.file).electricalDigest).toBe(circuitOf(file).electricalDigest);
  }
});
