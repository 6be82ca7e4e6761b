import { expect, it } from "vitest";
import { acrossSource, capacitor, rowOf } from "./one-part";

// MIL-STD-975M (NASA), 5 August 1994, Appendix A. The figures are rows of the derating data from memory.
const policy = { use: "mil-std-975m" };
const document = /^MIL-STD-975M \(NASA\), 5 August 1994, Appendix A/;

it("3.1 capacitors: a solid tantalum of 16 V may have 0.40 of it, 6.4 V, at 90 °C", () => {
  const part = capacitor({
    params: { capacitance: "10u" },
    style: "tantalum-solid",
    ratings: { voltage: 16 },
  });
  const at = (ambient: number) =>
    rowOf(
      acrossSource(5, [part], { conditions: [{ name: "Only", ambient }], policy }),
      "cap-tantalum-solid-voltage",
    );
  expect(at(90)?.limit).toBeCloseTo(6.4, 12);
  expect(at(90)?.rule).toMatchObject({
    document: expect.stringMatching(document),
    clause: "3.1 capacitors",
    status: "MEMORY",
  });
  // The standard asks for the series resistance too, which a file does not say: never a pass.
  expect(at(90)?.verdict).toBe("unknown");
  expect(at(90)?.needs?.join()).toContain("series resistance");
  expect(at(70)?.limit).toBeCloseTo(8, 12);
  // Beyond its last point the rule says nothing.
  expect(at(111)?.limit).toBeNull();
  expect(at(111)?.needs?.join()).toContain("111 °C");
});

it("3.9 protective devices: a 2 A fuse with 0.50 at 25 °C may carry 0.60 A at 65 °C", () => {
  const fuse = { ref: "F1", kind: "fuse", pins: { "1": "A", "2": "B" }, ratings: { current: 2 } };
  const load = {
    ref: "R1",
    kind: "resistor",
    pins: { "1": "B", "2": "GND" },
    params: { resistance: 20 },
  };
  const circuit = acrossSource(10, [fuse, load], {
    conditions: [{ name: "Only", ambient: 65 }],
    policy,
  });
  const large = rowOf(circuit, "fuse-current-high");
  // 0.50 less 0.005 per K over 40 K
  expect(large?.limit).toBeCloseTo(0.6, 12);
  expect(large?.applied).toBeCloseTo(0.5, 3);
  expect(large?.rule).toMatchObject({
    document: expect.stringMatching(document),
    clause: expect.stringMatching(/^3\.9 /),
    status: "MEMORY",
  });
  // Which of the two factors holds depends on the fuse's size, which nobody stated.
  expect(large?.verdict).toBe("unknown");
  expect(large?.needs).toContain("size");
  expect(rowOf(circuit, "fuse-current-low")?.limit).toBeCloseTo(0.1, 12);
});

it("says document, clause and status beside a verdict", () => {
  const part = capacitor({
    params: { capacitance: "1u" },
    style: "ceramic",
    ratings: { voltage: 16 },
  });
  const row = rowOf(acrossSource(5, [part], { policy }), "cap-ceramic-voltage");
  expect(row).toMatchObject({ applied: 5, rated: 16, verdict: "pass" });
  expect(row?.limit).toBeCloseTo(9.6, 12);
  expect(row?.ratio).toBeCloseTo(5 / 16, 12);
  expect(row?.margin).toBeCloseTo(9.6 / 5 - 1, 12);
  expect(row?.rule).toMatchObject({
    policy: "mil-std-975m",
    document: expect.stringMatching(document),
    clause: expect.stringMatching(/^3\.1 /),
    status: "MEMORY",
  });
});
