import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Point } from "../../lib/circuit/drawing";
import type { Box } from "../../lib/kinds/part-symbol";
import { lineBox, overlap } from "../../lib/sheet/box";
import { route } from "../../lib/sheet/route";

const place = fc
  .tuple(fc.integer({ min: 0, max: 60 }), fc.integer({ min: 0, max: 40 }))
  .map(([x, y]): Point => [x * 10, y * 10]);
const outward = fc.constantFrom<Point | null>([1, 0], [-1, 0], [0, 1], [0, -1], null);
const end = fc.record({ at: place, outward });
const box = place.map(([x, y]): Box => [x + 3, y + 3, x + 27, y + 17]);

describe("routes", () => {
  it("run along the grid's directions and end at both pins", () => {
    fc.assert(
      fc.property(end, end, fc.array(box, { maxLength: 5 }), (from, to, parts) => {
        const path = route(from, to, parts);
        expect(path[0]).toEqual(from.at);
        expect(path.at(-1)).toEqual(to.at);
        path.slice(1).forEach((point, index) => {
          const before = path[index] ?? point;
          expect(point[0] === before[0] || point[1] === before[1]).toBe(true);
        });
      }),
    );
  });

  it("are straight where both ends are in line and nothing stands between", () => {
    expect(route({ at: [0, 0], outward: [1, 0] }, { at: [50, 0], outward: [-1, 0] }, [])).toEqual([
      [0, 0],
      [50, 0],
    ]);
  });

  it("take one corner where a pin looks across and the other down", () => {
    const path = route({ at: [0, 0], outward: [1, 0] }, { at: [50, 40], outward: [0, -1] }, []);
    expect(path).toEqual([
      [0, 0],
      [50, 0],
      [50, 40],
    ]);
  });

  it("go around a part that stands between", () => {
    const part: Box = [21, -9, 39, 9];
    const path = route({ at: [0, 0], outward: [1, 0] }, { at: [60, 0], outward: [-1, 0] }, [part]);
    const crossed = path
      .slice(1)
      .some((point, index) => overlap(lineBox(path[index] ?? point, point, 0.5), part) > 0);
    expect(crossed).toBe(false);
    expect(path.length).toBeGreaterThan(2);
  });
});
