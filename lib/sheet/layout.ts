import type { CircuitFile, FileBlock } from "../circuit/circuit-file";
import type { Box } from "../kinds/part-symbol";
import { grown, lineBox } from "./box";
import { ClearSpace } from "./clear-space";
import { drawClouds } from "./clouds";
import { drawParts, type PlacedPart, placedParts } from "./draw-parts";
import { drawWires, type WireWork } from "./draw-wires";
import { drawFlag } from "./flags";
import { letteringBox } from "./lettering";
import { drawBalloons, drawNets, drawPartTags } from "./pencil";
import { namePin } from "./pin-names";
import { placeParts } from "./placing";
import type { DrawnPart, DrawnWire, Ground, Lettering, SheetDrawing } from "./sheet-drawing";
import type { SheetFacts } from "./sheet-facts";
import { zoneMarks } from "./zones";

/** 180 mm wide; the criteria and sign-off stand above the fields. */
const TITLE_BLOCK = { width: 386, full: 190, short: 70 };
const REVISION_BLOCK = { width: 270, row: 15 };
const NOTHING: FileBlock = { parts: [] };

/**
 * Draws a sheet: the same file and facts give the same drawing. Places what has no place, routes what has no
 * path, letters where it is clear; an invalid file is drawn as far as it goes.
 */
export function drawSheet(file: CircuitFile, facts: SheetFacts = {}): SheetDrawing {
  const block = blockOf(file, facts);
  const baseBlock = facts.base ? blockOf(facts.base, facts) : NOTHING;
  const { sheet, placings } = placeParts(block);
  const placed = placedParts(block, placings);
  const gone = removedParts(block, baseBlock);
  const wires = drawWires(block, symbolsOf(placed), null);
  const removedWires = drawWires(baseBlock, symbolsOf([...gone, ...placed]), refsOf(gone));

  const titleBlock = lowerRight(
    sheet.frame,
    TITLE_BLOCK.width,
    TITLE_BLOCK[facts.titleBlock ?? "short"],
  );
  const revisionBlock =
    facts.revisionRows === undefined
      ? null
      : upperRight(
          sheet.frame,
          REVISION_BLOCK.width,
          REVISION_BLOCK.row * (facts.revisionRows + 1),
        );
  const space = new ClearSpace(sheet.frame);
  space.take(titleBlock, ...(revisionBlock === null ? [] : [revisionBlock]));
  space.take(...[...placed, ...gone].map(({ symbol }) => symbol.box));

  const lone = nameLonePins(placed, wires, file.reference ?? null);
  const allWires = [...wires.wires, ...lone.wires, ...removedWires.wires];
  const grounds = [...wires.grounds, ...lone.grounds, ...removedWires.grounds];
  space.take(...allWires.flatMap(({ points }) => runs(points)), ...grounds.map(groundBox));

  const flagLabels = wires.labels.filter(({ label }) => label.shape === "flag");
  const flags = flagLabels.map(({ label, from }) => {
    const others = flagLabels.filter(
      (other) => other.label !== label && other.label.net === label.net,
    );
    return drawFlag(
      label,
      from,
      others.map((other) => other.label),
      sheet,
    );
  });
  const names = wires.labels
    .filter(({ label }) => label.shape === "name")
    .map(
      ({ label }): Lettering => ({ at: label.at, text: label.net, style: "net", anchor: "start" }),
    );
  const texts = [...sheetTexts(block), ...names, ...lone.letters];
  space.take(
    ...texts.map(letteringBox),
    ...flags.flatMap(({ outline, letters }) => [...runs(outline), ...letters.map(letteringBox)]),
  );

  const checked = new Set(facts.checked);
  const base = new Map(baseBlock.parts.map((part) => [part.ref, part]));
  space.take(
    ...placed.filter(({ part }) => checked.has(part.ref)).map(({ symbol }) => tickBox(symbol.box)),
  );
  const parts: DrawnPart[] = [
    ...drawParts(placed, base, false, checked, sheet, space),
    ...drawParts(gone, new Map(), true, checked, sheet, space),
  ];
  const edited = new Set(facts.edited);
  const changed = parts.filter(({ ref, removed }) => removed || edited.has(ref));
  const clouds = drawClouds(changed, facts.revision ?? "", space);

  const named = new Set(names.map(({ text }) => text).concat(flags.map(({ net }) => net)));
  const partTags = drawPartTags(facts, parts, space);
  const nets = drawNets(facts, parts, allWires, {
    sheet,
    space,
    named,
    reference: file.reference ?? null,
  });
  const balloons = drawBalloons(facts, { parts, nets, partTags, clouds, sheet, space });

  return {
    width: sheet.width,
    height: sheet.height,
    frame: sheet.frame,
    zones: zoneMarks(sheet),
    parts,
    wires: allWires,
    dots: [...wires.dots, ...removedWires.dots],
    grounds,
    flags,
    texts,
    nets,
    partTags,
    clouds,
    balloons,
    titleBlock,
    revisionBlock,
  };
}

function blockOf(file: CircuitFile, { block }: SheetFacts): FileBlock {
  return file.blocks[block ?? file.top ?? "main"] ?? Object.values(file.blocks)[0] ?? NOTHING;
}

/** Parts that the base alone has, where the base puts them. */
function removedParts(block: FileBlock, base: FileBlock): PlacedPart[] {
  const kept = new Set(block.parts.map(({ ref }) => ref));
  return placedParts(base, placeParts(base).placings).filter(({ part }) => !kept.has(part.ref));
}

/** Later ones win: what is still there stands where it stands now. */
function symbolsOf(placed: readonly PlacedPart[]): ReadonlyMap<string, PlacedPart["symbol"]> {
  return new Map(placed.map(({ part, symbol }) => [part.ref, symbol]));
}

function refsOf(placed: readonly PlacedPart[]): ReadonlySet<string> {
  return new Set(placed.map(({ part }) => part.ref));
}

function nameLonePins(placed: readonly PlacedPart[], work: WireWork, reference: string | null) {
  const letters: Lettering[] = [];
  const grounds: Ground[] = [];
  const wires: DrawnWire[] = [];
  for (const { part, pin } of work.lonePins) {
    const drawn = placed
      .find((one) => one.part.ref === part)
      ?.symbol.pins.find(({ name }) => name === pin);
    if (drawn === undefined) continue;
    const { letter, ground, wire } = namePin(drawn, reference);
    if (letter !== null) letters.push(letter);
    if (ground !== null) grounds.push(ground);
    if (wire !== null) wires.push(wire);
  }
  return { letters, grounds, wires };
}

function sheetTexts(block: FileBlock): Lettering[] {
  return (block.sheet?.texts ?? []).flatMap(({ at: [x, y], text, style }) =>
    text.split("\n").map(
      (line, index): Lettering => ({
        at: [x, y + 13 * index],
        text: line,
        style,
        anchor: "start",
      }),
    ),
  );
}

function runs(points: readonly (readonly [number, number])[]): Box[] {
  return points.slice(1).map((point, index) => lineBox(points[index] ?? point, point));
}

function groundBox({ at: [x, y] }: Ground): Box {
  return [x - 9, y, x + 9, y + 8];
}

/** The tick of a checked part stands outside its upper right corner. */
function tickBox(box: Box): Box {
  const [, top, right] = grown(box, 4);
  return [right, top - 6, right + 10, top + 4];
}

function lowerRight([, , right, bottom]: Box, width: number, height: number): Box {
  return [right - width, bottom - height, right, bottom];
}

function upperRight([, top, right]: Box, width: number, height: number): Box {
  return [right - width, top, right, top + height];
}
