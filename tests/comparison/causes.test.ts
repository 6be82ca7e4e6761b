import { describe, expect, it } from "vitest";
import { compare } from "../../lib/comparison/compare";
import { separableGroups } from "../../lib/comparison/separable";
import { circuitOf, resistor, source } from "./circuits";

const divider = (upper: string, lower: string, dc: number | string = 24) => [
  source(dc),
  resistor("R1", "IN", "OUT", upper),
  resistor("R2", "OUT", "GND", lower),
];

/** The shares in one net or part by the edits' ids. */
function shares(
  comparison: ReturnType<typeof compare>,
  of: { readonly net?: string; readonly part?: string },
): Readonly<Record<string, number>> {
  return Object.fromEntries(
    comparison.causes
      .filter(({ net, part }) => net === of.net && part === of.part)
      .map(({ edit, share }) => [edit, share]),
  );
}

describe("shares worked by hand, with an interaction", () => {
  it("of a divider whose source and lower resistor change together", () => {
    // 24 V, 10k/10k: 12 V. Source alone to 12 V: 6 V (-6). R2 alone to 30k: 18 V (+6). Both: 9 V (-3).
    // V1: ((6 - 12) + (9 - 18)) / 2 = -7.5; R2: ((18 - 12) + (9 - 6)) / 2 = 4.5.
    const found = compare(circuitOf(divider("10k", "10k")), circuitOf(divider("10k", "30k", 12)));
    expect(shares(found, { net: "OUT" })).toEqual({
      "V1.dc": expect.closeTo(-7.5, 9),
      "R2.resistance": expect.closeTo(4.5, 9),
    });
    // The source's own net is moved by the source alone.
    expect(shares(found, { net: "IN" })).toEqual({ "V1.dc": -12, "R2.resistance": 0 });
  });

  it("of a margin that a value and a rating shrink together", () => {
    // 24 V across 10 kΩ of 1 W: 57.6 mW against 0.6 W, margin m = 0.6 P R / 576 V^2 - 1 = 9.4167.
    // R alone to 5 kΩ: 4.2083. P alone to 0.5 W: 4.2083. Both: 1.6042. Each: (-5.2083 - 2.6042) / 2.
    const part = (resistance: string, power: number) =>
      circuitOf([
        source(24),
        resistor("R1", "IN", "GND", resistance, { ratings: { power, voltage: 100 } }),
      ]);
    const found = compare(part("10k", 1), part("5k", 0.5));
    expect(shares(found, { part: "R1" })).toEqual({
      "R1.resistance": expect.closeTo(-3.90625, 9),
      "R1.ratings.power": expect.closeTo(-3.90625, 9),
    });
  });
});

describe("an edit", () => {
  it("that touches nothing has a share of zero", () => {
    const aside = (value: string) => [
      ...divider("10k", value === "1k" ? "10k" : "20k"),
      resistor("R9", "GND", "AWAY", value),
    ];
    const found = compare(circuitOf(aside("1k")), circuitOf(aside("2k")));
    expect(shares(found, { net: "OUT" })).toEqual({
      "R2.resistance": expect.closeTo(4, 9),
      "R9.resistance": 0,
    });
  });

  it("like another has a like share", () => {
    const pair = (value: string) => [
      source(10),
      resistor("R1", "IN", "OUT", "1k"),
      resistor("R2", "OUT", "GND", value),
      resistor("R3", "OUT", "GND", value),
    ];
    const found = shares(compare(circuitOf(pair("4k")), circuitOf(pair("2k"))), { net: "OUT" });
    // 10 V x 2/3 to 10 V x 1/2, half each.
    expect(found["R2.resistance"]).toBeCloseTo(-10 / 12, 9);
    expect(found["R3.resistance"]).toBeCloseTo(-10 / 12, 9);
  });

  it("of a rating or the policy alone moves margins and no voltage", () => {
    const parts = (power: number) => [
      source(24),
      resistor("R1", "IN", "GND", "10k", { ratings: { power, voltage: 100 } }),
    ];
    const rated = compare(circuitOf(parts(1)), circuitOf(parts(0.5)));
    expect(rated.nets).toEqual([]);
    expect(rated.edits).toMatchObject([
      { change: "rating", key: "ratings.power", was: 1, is: 0.5 },
    ]);
    expect(shares(rated, { part: "R1" })).toEqual({
      "R1.ratings.power": expect.closeTo(-5.208333, 6),
    });
    const rules = [
      {
        id: "cp-res-power",
        kinds: ["resistor"],
        quantity: "power",
        form: "ratio",
        rating: "power",
        points: [[25, 0.3]],
      },
    ];
    const judged = compare(
      circuitOf(parts(1)),
      circuitOf(parts(1), { policy: { use: "common-practice", rules } }),
    );
    expect(judged.nets).toEqual([]);
    expect(Object.keys(shares(judged, { part: "R1" }))).toEqual(["policy"]);
  });

  it("of the reference or a block's ports is an edit too", () => {
    const found = compare(
      circuitOf(divider("10k", "10k")),
      circuitOf(divider("10k", "10k"), { reference: "OUT" }),
    );
    expect(found.edits).toMatchObject([{ id: "reference", is: "OUT" }]);
    expect(shares(found, { net: "IN" })).toEqual({ reference: expect.closeTo(-12, 9) });
  });
});

describe("edits that have no solution without one another", () => {
  it("count as one cause, are named, and leave the other edits their own shares", () => {
    // V2 in place of V1 between the same nets: both at once would fight.
    const [, ...rest] = divider("10k", "10k");
    const base = circuitOf([{ ...source(24), id: "old" }, ...rest]);
    const pins = { "1": "OUT", "2": "GND" };
    const found = compare(
      base,
      circuitOf([
        { ...source(12, "V2"), id: "new" },
        ...divider("10k", "30k").slice(1),
        { ref: "C1", kind: "capacitor", pins, params: { capacitance: 1e-6 } },
      ]),
    );
    expect(found.problems).toEqual([
      { code: "editsInseparable", message: expect.stringMatching(/^V2 added, V1 removed: /) },
    ]);
    // As worked above: source -7.5 V in two halves, R2 4.5 V, a capacitor nothing.
    expect(shares(found, { net: "OUT" })).toEqual({
      "R2.resistance": expect.closeTo(4.5, 9),
      "V2 added": expect.closeTo(-3.75, 9),
      "C1 added": expect.closeTo(0, 9),
      "V1 removed": expect.closeTo(-3.75, 9),
    });
  });

  it("are put together no more than is needed", () => {
    // Player 0 cannot go without 2; 1 and 3 are free.
    const groups = separableGroups(4, (subset) => (subset & 1) === ((subset >> 2) & 1));
    expect(groups).toEqual([0b0101, 0b0010, 0b1000]);
    expect(separableGroups(3, () => true)).toEqual([1, 2, 4]);
    expect(separableGroups(3, (subset) => subset === 0 || subset === 7)).toEqual([7]);
  });
});

describe("many edits", () => {
  const chain = (length: number, value: (k: number) => number) =>
    circuitOf([
      source(24),
      ...Array.from({ length }, (_, k) =>
        resistor(`R${k}`, k === 0 ? "IN" : `N${k - 1}`, `N${k}`, value(k)),
      ),
      resistor("RL", `N${length - 1}`, "GND", 10_000),
    ]);

  it("beyond eight are taken in groups, it is said, and the shares still add up", () => {
    const found = compare(
      chain(11, () => 1000),
      chain(11, (k) => 1100 + 100 * k),
    );
    expect(found.edits).toHaveLength(11);
    expect(found.problems).toEqual([
      { code: "editsGrouped", message: expect.stringContaining("11 edits") },
    ]);
    expect(found.nets).toHaveLength(11);
    for (const { net, shift } of found.nets) {
      const rows = Object.values(shares(found, { net }));
      expect(rows).toHaveLength(11);
      expect(rows.reduce((sum, share) => sum + share, 0)).toBeCloseTo(shift ?? Number.NaN, 9);
    }
  });

  it("up to eight are told apart one by one", () => {
    const found = compare(
      chain(8, () => 1000),
      chain(8, () => 1100),
    );
    expect(found.problems).toEqual([]);
    const rows = Object.values(shares(found, { net: "N7" }));
    for (const share of rows) expect(share).toBeCloseTo(rows[0] ?? Number.NaN, 9);
  });
});

describe("a condition without a solution", () => {
  const parts = (resistance: string) => [
    ...divider("10k", resistance),
    { ref: "V2", kind: "voltageSource", pins: { plus: "B", minus: "GND" }, params: { dc: 3 } },
    { ref: "S1", kind: "switch", pins: { "1": "IN", "2": "B" }, params: { closedResistance: 0 } },
  ];
  const conditions = [{ name: "Open" }, { name: "Closed", set: { "S1.closed": true } }];

  it("is said of both sides, and the other conditions are compared in full", () => {
    const found = compare(
      circuitOf(parts("10k"), { conditions }),
      circuitOf(parts("30k"), { conditions }),
    );
    expect(found.problems.map(({ message }) => message.split(":")[0])).toEqual([
      "base",
      "proposed",
    ]);
    const row = found.nets.find(({ net, condition }) => net === "OUT" && condition === "Open");
    expect(row).toMatchObject({ was: 12, is: 18, shift: 6, significant: true });
    expect(shares(found, { net: "OUT" })).toEqual({ "R2.resistance": expect.closeTo(6, 9) });
  });

  it("on one side alone gives rows without a shift, and no share of what is not known", () => {
    const fought = circuitOf([...divider("10k", "10k"), source(5, "V2")]);
    const found = compare(circuitOf(divider("10k", "10k")), fought);
    expect(found.edits).toMatchObject([{ id: "V2 added" }]);
    expect(found.problems).toMatchObject([{ code: "sourcesFight" }]);
    expect(found.causes).toEqual([]);
    for (const { shift } of found.nets) expect(shift).toBeNull();
  });

  it("that one side does not have gives no rows of nets", () => {
    const named = (name: string) => circuitOf(divider("10k", "10k"), { conditions: [{ name }] });
    const found = compare(named("Old"), named("New"));
    expect(found.nets).toEqual([]);
    expect(found.edits.map(({ id }) => id)).toEqual([
      "condition New added",
      "condition Old removed",
    ]);
  });
});
