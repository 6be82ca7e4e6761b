import type { FileBlock, FilePart } from "../circuit/circuit-file";
import type { ClearSpace } from "./clear-space";
import { letterPart } from "./letter-parts";
import { type PlacedSymbol, type Placing, placeSymbol } from "./pin-place";
import type { DrawnPart } from "./sheet-drawing";
import { valueText } from "./value-text";
import { type Paper, zoneAt } from "./zones";

/** A part with its place and its turned symbol. */
export interface PlacedPart {
  readonly part: FilePart;
  readonly placing: Placing;
  readonly symbol: PlacedSymbol;
}

export function placedParts(block: FileBlock, placings: readonly Placing[]): PlacedPart[] {
  return block.parts.flatMap((part, index) => {
    const placing = placings[index];
    return placing === undefined ? [] : [{ part, placing, symbol: placeSymbol(part, placing) }];
  });
}

/** Letters the parts where it is clear, the struck value of the base before the new one. */
export function drawParts(
  placed: readonly PlacedPart[],
  base: ReadonlyMap<string, FilePart>,
  removed: boolean,
  checked: ReadonlySet<string>,
  sheet: Paper,
  space: ClearSpace,
): DrawnPart[] {
  return placed.map(({ part, placing, symbol }): DrawnPart => {
    const value = valueText(part);
    const before = base.get(part.ref);
    const was = before === undefined ? "" : valueText(before);
    const words = {
      ref: part.ref,
      value,
      was: was === "" || was === value ? null : was,
      removed,
    };
    return {
      ref: part.ref,
      kind: part.kind,
      strokes: symbol.strokes,
      origins: symbol.origins,
      turn: placing.turn,
      mirror: placing.mirror,
      at: placing.at,
      pins: symbol.pins,
      box: symbol.box,
      letters: letterPart(words, symbol.box, space),
      value,
      zone: zoneAt(sheet, placing.at),
      removed,
      checked: checked.has(part.ref),
    };
  });
}
