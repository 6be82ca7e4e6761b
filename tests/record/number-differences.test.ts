import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { numberDifferences } from "../../lib/record/number-differences";

const finite = fc.double({ noNaN: true, noDefaultInfinity: true });
const json = fc.jsonValue();

describe("the differences between two results", () => {
  it("are none between a value and itself, and as many in either direction", () => {
    fc.assert(
      fc.property(json, json, (was, is) => {
        expect(numberDifferences(was, structuredClone(was))).toEqual([]);
        expect(numberDifferences(is, was)).toHaveLength(numberDifferences(was, is).length);
      }),
    );
  });

  it("are none within 1e-6 of a number or 1e-9, and one beyond both", () => {
    fc.assert(
      fc.property(finite, fc.double({ min: -1, max: 1, noNaN: true }), (was, part) => {
        const allowed = Math.max(1e-9, 1e-6 * Math.abs(was));
        fc.pre(Number.isFinite(was + 2 * allowed) && Number.isFinite(was - 2 * allowed));
        expect(numberDifferences(was, was + 0.99 * part * allowed)).toEqual([]);
        const beyond = was + Math.sign(part || 1) * (1.01 * allowed + Math.abs(part) * allowed);
        expect(numberDifferences(was, beyond)).toHaveLength(1);
      }),
    );
  });

  it("are found at every place where a number moved, and named by it", () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: -99, max: 99 }), { minLength: 1 }),
        fc.nat(),
        (row, n) => {
          const place = n % row.length;
          const moved = row.map((value, index) => (index === place ? value + 1 : value));
          expect(numberDifferences({ nets: { OUT: row } }, { nets: { OUT: moved } })).toEqual([
            `nets.OUT[${place}]: ${row[place]} in the record, ${moved[place]} now`,
          ]);
        },
      ),
    );
  });

  it("never take what is no number for one", () => {
    for (const odd of [Number.NaN, Number.POSITIVE_INFINITY, null, "1", undefined, [1], { a: 1 }])
      expect(numberDifferences({ a: 1 }, { a: odd })).toHaveLength(1);
    expect(numberDifferences({ a: Number.NaN }, { a: Number.NaN })).toHaveLength(1);
  });

  it("count a key that only one has", () => {
    expect(numberDifferences({ a: 1 }, { a: 1, b: 2 })).toEqual([
      "b: undefined in the record, 2 now",
    ]);
    expect(numberDifferences([1], [1, 2])).toEqual([": 1 rows in the record, 2 now"]);
  });

  it("leave out the engine's version, proofs and points in time, but no net of such a name", () => {
    const condition = {
      certificate: 1,
      transient: { time: [1] },
      nets: { engine: 1, transient: 1 },
    };
    const was = { engine: "0.1.0", conditions: [condition] };
    const is = {
      engine: "0.2.0",
      conditions: [{ certificate: 2, transient: null, nets: { engine: 2, transient: 2 } }],
    };
    expect(numberDifferences(was, is)).toEqual([
      "conditions[0].nets.engine: 1 in the record, 2 now",
      "conditions[0].nets.transient: 1 in the record, 2 now",
    ]);
    expect(
      numberDifferences({ digest: "a", certificate: 1 }, { digest: "b", certificate: 2 }),
    ).toHaveLength(2);
  });
});
