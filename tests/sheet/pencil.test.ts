import { describe, expect, it } from "vitest";
import { inside, overlap } from "../../lib/sheet/box";
import { drawSheet } from "../../lib/sheet/layout";
import { letteringBox } from "../../lib/sheet/lettering";
import { paper, zoneAt } from "../../lib/sheet/zones";
import { demoFiles } from "./demo-files";

const files = new Map(demoFiles());
const proposed = files.get("ffc-2-C.json");
const base = files.get("ffc-2-B.json");
if (proposed === undefined || base === undefined)
  throw new Error("the demonstration files are missing");

const drawing = drawSheet(proposed, {
  base,
  revision: "C",
  edited: ["R7", "R9", "K1"],
  checked: ["R1"],
  netReadings: [
    { net: "TREF", level: "past", is: "6.021 V", was: "5.734", shift: "+0.287" },
    { net: "OPO", level: "moved", is: "13.07 V", was: "12.87", shift: "+0.199" },
  ],
  partReadings: [{ part: "Q1", caption: "Q1 junct.", level: "past", is: "118.7 °C", was: "97.0" }],
  findings: [
    { id: "f1", number: 1, severity: "major", anchor: { net: "TREF" } },
    { id: "f2", number: 2, severity: "question", anchor: { part: "U2" } },
    { id: "f3", number: 3, severity: "minor", anchor: { part: "not on this sheet" } },
  ],
});

describe("a comparison on the sheet", () => {
  it("draws a removed part where it was, struck, with the wires it hung on", () => {
    const removed = drawing.parts.filter((part) => part.removed);
    expect(removed.map(({ ref }) => ref)).toEqual(["C3"]);
    expect(removed[0]?.letters.every(({ pencil }) => pencil === "was")).toBe(true);
    expect(drawing.wires.some((wire) => wire.removed)).toBe(true);
  });

  it("strikes the value before and letters the new one after it", () => {
    const letters = drawing.parts.find(({ ref }) => ref === "R7")?.letters ?? [];
    expect(letters.map(({ text, pencil }) => [text, pencil])).toEqual([
      ["R7", undefined],
      ["30k", "was"],
      ["33k", undefined],
    ]);
  });

  it("clouds every edited or removed part, and each part and its lettering lie inside", () => {
    expect(drawing.clouds.flatMap(({ parts }) => parts).sort()).toEqual(["C3", "K1", "R7", "R9"]);
    for (const cloud of drawing.clouds) {
      expect(cloud.letter).toBe("C");
      for (const ref of cloud.parts) {
        const part = drawing.parts.find((one) => one.ref === ref);
        for (const letters of part?.letters ?? [])
          expect(inside(letteringBox(letters), cloud.box)).toBe(true);
      }
    }
  });

  it("boxes what moved, with a line that ends on the net", () => {
    for (const name of ["TREF", "OPO"]) {
      const tag = drawing.nets.find(({ net }) => net === name)?.tag;
      const end = tag?.leader.at(-1) ?? [Number.NaN, Number.NaN];
      const onNet = drawing.wires
        .filter(({ net }) => net === name)
        .some(({ points }) =>
          points.slice(1).some(([x, y], index) => {
            const [fromX, fromY] = points[index] ?? [x, y];
            return (
              Math.min(x, fromX) <= end[0] &&
              end[0] <= Math.max(x, fromX) &&
              Math.min(y, fromY) <= end[1] &&
              end[1] <= Math.max(y, fromY)
            );
          }),
        );
      expect(tag?.box).not.toBeNull();
      expect(onNet).toBe(true);
    }
  });

  it("keeps boxes clear of parts, of each other and of the title block", () => {
    expect(drawing.partTags.length).toBe(1);
    const boxes = [
      ...drawing.nets.flatMap(({ tag }) => (tag?.box ? [tag.box] : [])),
      ...drawing.partTags.flatMap(({ box }) => (box ? [box] : [])),
    ];
    expect(boxes.length).toBe(3);
    boxes.forEach((box, index) => {
      expect(overlap(box, drawing.titleBlock)).toBe(0);
      for (const { box: part } of drawing.parts) expect(overlap(box, part)).toBe(0);
      for (const other of boxes.slice(index + 1)) expect(overlap(box, other)).toBe(0);
    });
  });

  it("ties a balloon to every finding whose place is on the sheet", () => {
    expect(drawing.balloons.map(({ id }) => id)).toEqual(["f1", "f2"]);
  });

  it("marks what was checked", () => {
    expect(drawing.parts.filter(({ checked }) => checked).map(({ ref }) => ref)).toEqual(["R1"]);
  });
});

describe("zones", () => {
  // ISO 5457: letters downward without I and O, numerals to the right; fields of 50 mm from the centring marks.
  it("names the field of a place", () => {
    const sheet = paper("A3");
    expect([sheet.width, sheet.height]).toEqual([900, 636]);
    expect(zoneAt(sheet, [50, 30])).toBe("A1");
    expect(zoneAt(sheet, [449, 317])).toBe("C4");
    expect(zoneAt(sheet, [451, 319])).toBe("D5");
    expect(zoneAt(sheet, [870, 610])).toBe("F8");
  });

  it("has the fields of the standard on every paper, and 50 mm between inner lines", () => {
    const fields = { A4: [6, 4], A3: [8, 6], A2: [12, 8], A1: [16, 12], A0: [24, 16] } as const;
    for (const size of ["A4", "A3", "A2", "A1", "A0"] as const) {
      const sheet = paper(size);
      const last = zoneAt(sheet, [sheet.width - 22, sheet.height - 22]);
      const [across, down] = fields[size];
      expect(last).toBe(`${"ABCDEFGHJKLMNPQR".charAt(down - 1)}${across}`);
    }
  });
});
