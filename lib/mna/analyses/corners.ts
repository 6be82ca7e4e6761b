import type { Waveform } from "../../circuit/analysis";
import type { Part } from "../../kinds/part";
import { CLOSED_ABOVE } from "../../kinds/switch-law";
import { waveformCorners, waveformValue } from "../../kinds/waveform-value";

const HALVINGS = 60;
/** Pieces of a sine's period within which it crosses a level at most once. */
const PIECES = 8;

/** The times in (0, until) at which a source jumps or bends or a switch works, ascending. */
export function cornersOf(parts: readonly Part[], until: number): readonly number[] {
  const corners = new Set<number>();
  for (const part of parts) {
    if (part.kind === "voltageSource" || part.kind === "currentSource") {
      if (part.params.waveform === null) continue;
      for (const time of waveformCorners(part.params.waveform, until)) corners.add(time);
    } else if (part.kind === "switch" && part.params.waveform !== null) {
      for (const time of crossings(part.params.waveform, until)) corners.add(time);
    }
  }
  return [...corners].sort((one, other) => one - other);
}

/** When a switch's waveform crosses the level, found in every piece between corners. */
function crossings(waveform: Waveform, until: number): readonly number[] {
  const found: number[] = [];
  const times = pieces(waveform, until);
  let last = 0;
  let was = closedAt(waveform, 0);
  for (const time of times) {
    const is = closedAt(waveform, time);
    if (is !== was) found.push(located(waveform, last, time, was));
    last = time;
    was = is;
  }
  return found.filter((time) => time > 0 && time < until);
}

function pieces(waveform: Waveform, until: number): readonly number[] {
  const corners = [...waveformCorners(waveform, until), until];
  if (waveform.shape !== "sine") return corners;
  const width = 1 / (waveform.frequency * PIECES);
  for (let time = waveform.delay; time < until; time += width) corners.push(time);
  return corners.sort((one, other) => one - other);
}

function located(waveform: Waveform, from: number, to: number, was: boolean): number {
  let [low, high] = [from, to];
  for (let k = 0; k < HALVINGS; k++) {
    const middle = (low + high) / 2;
    if (middle <= low || middle >= high) break;
    if (closedAt(waveform, middle) === was) low = middle;
    else high = middle;
  }
  return high;
}

function closedAt(waveform: Waveform, time: number): boolean {
  return waveformValue(waveform, time) > CLOSED_ABOVE;
}
