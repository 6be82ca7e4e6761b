import type { State } from "./tr-bdf2";
import { STAGE } from "./tr-bdf2";

/** Of the swing: straight lines between stored points stay within half of what is promised. */
const STRAIGHT_WITHIN = 5e-4;
const MOST_BETWEEN = 16;

/** Stores the courses of nets so that straight lines between the points stay within 1e-3 of the swing. */
export class Recorder {
  readonly time: number[] = [];
  private readonly courses: number[][];
  private readonly least: Float64Array;
  private readonly greatest: Float64Array;

  /** @param unknowns of the nets to record */
  constructor(private readonly unknowns: readonly number[]) {
    this.courses = unknowns.map(() => []);
    this.least = new Float64Array(unknowns.length).fill(Number.POSITIVE_INFINITY);
    this.greatest = new Float64Array(unknowns.length).fill(Number.NEGATIVE_INFINITY);
  }

  get stored(): number {
    return this.time.length * this.unknowns.length;
  }

  /** A point as it is. */
  add(time: number, x: Float64Array): void {
    this.push(time, (unknown) => x[unknown] ?? 0);
  }

  /** The end of a step, and as many points of the parabola through its three states as a bend needs. */
  addStep(start: State, middle: State, end: State, endTime: number): void {
    const between = this.pointsBetween(start, middle, end);
    for (let k = 1; k <= between; k++) {
      const part = k / (between + 1);
      const time = start.time + part * (end.time - start.time);
      this.push(time, (unknown) =>
        parabola(part, start.x[unknown] ?? 0, middle.x[unknown] ?? 0, end.x[unknown] ?? 0),
      );
    }
    this.add(endTime, end.x);
  }

  /** By net, in the order of the unknowns. */
  get values(): readonly (readonly number[])[] {
    return this.courses;
  }

  private pointsBetween(start: State, middle: State, end: State): number {
    let most = 0;
    this.unknowns.forEach((unknown, n) => {
      const a = start.x[unknown] ?? 0;
      const b = end.x[unknown] ?? 0;
      const bend = Math.abs((middle.x[unknown] ?? 0) - (a + STAGE * (b - a)));
      const low = Math.min(this.least[n] ?? a, a, b);
      const high = Math.max(this.greatest[n] ?? a, a, b);
      const allowed = STRAIGHT_WITHIN * (high - low);
      if (bend > allowed && bend > 0) most = Math.max(most, Math.sqrt(bend / allowed));
    });
    return Math.min(MOST_BETWEEN, Math.ceil(most));
  }

  private push(time: number, value: (unknown: number) => number): void {
    this.time.push(time);
    this.unknowns.forEach((unknown, n) => {
      const v = value(unknown);
      this.courses[n]?.push(v);
      this.least[n] = Math.min(this.least[n] ?? v, v);
      this.greatest[n] = Math.max(this.greatest[n] ?? v, v);
    });
  }
}

/** At a part of the step, through values at 0, STAGE and 1. */
function parabola(part: number, start: number, middle: number, end: number): number {
  const l0 = ((part - STAGE) * (part - 1)) / STAGE;
  const l1 = (part * (part - 1)) / (STAGE * (STAGE - 1));
  const l2 = (part * (part - STAGE)) / (1 - STAGE);
  return l0 * start + l1 * middle + l2 * end;
}
