import type { Box } from "../kinds/part-symbol";
import { inside, overlap } from "./box";

/** Leaving the frame counts like lying on this much ink. */
const OUTSIDE = 100_000;

/** One way to set something: the room it needs, and what it is. */
export interface Choice<Value> {
  readonly boxes: readonly Box[];
  readonly value: Value;
}

/** What is still clear inside a frame. */
export class ClearSpace {
  readonly #taken: Box[] = [];

  constructor(readonly frame: Box) {}

  take(...boxes: readonly Box[]): void {
    this.#taken.push(...boxes);
  }

  /** How much ink lies under a box; 0 where it is clear. */
  ink(box: Box): number {
    let sum = inside(box, this.frame) ? 0 : OUTSIDE;
    for (const taken of this.#taken) sum += overlap(box, taken);
    return sum;
  }

  /** The first choice that is clear; null where none is. Takes its room. */
  clear<Value>(choices: Iterable<Choice<Value>>): Value | null {
    for (const { boxes, value } of choices) {
      if (boxes.some((box) => this.ink(box) > 0)) continue;
      this.take(...boxes);
      return value;
    }
    return null;
  }

  /** The first choice that is clear, else the one on the least ink. Takes its room. Null where there is none. */
  settle<Value>(choices: Iterable<Choice<Value>>): Value | null {
    let best: Choice<Value> | null = null;
    let least = Number.POSITIVE_INFINITY;
    for (const choice of choices) {
      const ink = choice.boxes.reduce((sum, box) => sum + this.ink(box), 0);
      if (ink < least) {
        least = ink;
        best = choice;
      }
      if (ink === 0) break;
    }
    if (best === null) return null;
    this.take(...best.boxes);
    return best.value;
  }
}
