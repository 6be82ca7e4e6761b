import { describe, expect, it } from "vitest";
import type { CircuitFile } from "../../lib/circuit/circuit-file";
import type { Box } from "../../lib/kinds/part-symbol";
import { inside, overlap } from "../../lib/sheet/box";
import { drawSheet } from "../../lib/sheet/layout";
import { letteringBox } from "../../lib/sheet/lettering";
import type { SheetDrawing } from "../../lib/sheet/sheet-drawing";
import { demoFiles } from "./demo-files";

function lettering(drawing: SheetDrawing): { text: string; box: Box }[] {
  const tags = [...drawing.nets.flatMap(({ tag }) => tag ?? []), ...drawing.partTags];
  return [
    ...drawing.texts,
    ...drawing.parts.flatMap(({ letters }) => letters),
    ...drawing.flags.flatMap(({ letters }) => letters),
    ...tags.flatMap(({ letters }) => letters),
  ].map((letters) => ({ text: letters.text, box: letteringBox(letters) }));
}

/** Letterings that lie on one another, or on a part other than by touching. */
function collisions(drawing: SheetDrawing): string[] {
  const all = lettering(drawing);
  const found: string[] = [];
  all.forEach(({ text, box }, index) => {
    for (const other of all.slice(index + 1)) {
      if (overlap(box, other.box) > 1) found.push(`${text} on ${other.text}`);
    }
    for (const part of drawing.parts) {
      if (overlap(box, part.box) > 1) found.push(`${text} on part ${part.ref}`);
    }
  });
  return found;
}

const files = demoFiles();

describe.each(files)("the sheet of %s", (_, file) => {
  const netReadings = [
    ...new Set(
      Object.values(file.blocks).flatMap(({ parts }) =>
        parts.flatMap(({ pins }) => Object.values(pins ?? {})),
      ),
    ),
  ].flatMap((net) => (net === null ? [] : [{ net, level: "quiet" as const, is: "12.345 V" }]));
  const drawing = drawSheet(file, { netReadings, titleBlock: "full", revisionRows: 3 });

  it("has no lettering over lettering or over a part", () => {
    expect(collisions(drawing)).toEqual([]);
  });

  it("keeps its frame on the paper and its parts and numbers in the frame", () => {
    expect(inside(drawing.frame, [0, 0, drawing.width, drawing.height])).toBe(true);
    for (const { box } of [...drawing.parts, ...lettering(drawing)]) {
      expect(inside(box, drawing.frame)).toBe(true);
      expect(overlap(box, drawing.titleBlock)).toBe(0);
    }
  });

  it("wires every pin: none needs its net written beside it", () => {
    const names = Object.values(file.blocks).flatMap(({ sheet }) => sheet?.texts ?? []);
    expect(drawing.texts.length).toBe(names.flatMap(({ text }) => text.split("\n")).length);
  });

  it("ends every wire at pins, junctions and labels of one net", () => {
    const pins = drawing.parts.flatMap((part) => part.pins);
    for (const { net, points } of drawing.wires) {
      expect(net).not.toBeNull();
      for (const at of [points[0], points.at(-1)]) {
        for (const pin of pins.filter((one) => one.at.join() === at?.join()))
          expect(pin.net).toBe(net);
      }
    }
  });

  it("shows a number for every net but the reference", () => {
    const shown = drawing.nets.filter(({ tag }) => tag !== null).map(({ net }) => net);
    expect(shown.sort()).toEqual(
      netReadings
        .map(({ net }) => net)
        .filter((net) => net !== file.reference)
        .sort(),
    );
  });

  it("comes out the same twice", () => {
    expect(drawSheet(file, { netReadings, titleBlock: "full", revisionRows: 3 })).toEqual(drawing);
  });
});

describe("a file without a drawing", () => {
  const [, demo] = files[0] ?? [];
  const bare: CircuitFile = {
    ampersign: 1,
    reference: "GND",
    blocks: {
      main: {
        parts: (demo?.blocks["main"]?.parts ?? []).map(({ at: _at, turn: _turn, ...part }) => part),
      },
    },
  };
  const drawing = drawSheet(bare);

  it("is placed on a grid without parts on parts or outside the frame", () => {
    expect(drawing.parts.length).toBeGreaterThan(5);
    drawing.parts.forEach((part, index) => {
      expect(inside(part.box, drawing.frame)).toBe(true);
      for (const other of drawing.parts.slice(index + 1))
        expect(overlap(part.box, other.box)).toBe(0);
    });
  });

  it("names the net at every pin, or draws the ground there", () => {
    const pins = drawing.parts.flatMap((part) => part.pins);
    const grounded = pins.filter(({ net }) => net === "GND");
    expect(drawing.grounds.length).toBe(grounded.length);
    expect(drawing.texts.length).toBe(pins.length - grounded.length);
  });

  it("takes larger paper for more parts, and still draws a thousand", () => {
    const parts = Array.from({ length: 1000 }, (_, index) => ({
      ref: `R${index}`,
      kind: "resistor",
      pins: { 1: "A", 2: "B" },
    }));
    const many = drawSheet({ ampersign: 1, blocks: { main: { parts } } });
    expect(many.parts.length).toBe(1000);
    expect(many.width).toBeGreaterThan(drawing.width);
  });

  it("draws an empty file and one whose wires lead nowhere", () => {
    expect(drawSheet({ ampersign: 1, blocks: {} }).parts).toEqual([]);
    const wires = [{ a: { part: "R1", pin: "1" }, b: { junction: "gone" } }];
    const parts = [{ ref: "R1", kind: "resistor", pins: { 1: "A", 2: "A" } }];
    expect(drawSheet({ ampersign: 1, blocks: { main: { parts, wires } } }).wires).toEqual([]);
  });
});
