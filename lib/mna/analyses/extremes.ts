import type { Extreme } from "../solution";

interface Running {
  min: number;
  max: number;
  atMin: number;
  atMax: number;
  /** Integral of the square, and over what. */
  square: number;
  last: number;
  lastAt: number;
  firstAt: number;
}

/** Collects least, greatest and root-mean-square of named courses (of time, or of a swept value). */
export class Extremes {
  private readonly running = new Map<string, Running>();

  add(name: string, at: number, value: number): void {
    const course = this.running.get(name);
    if (course === undefined) {
      this.running.set(name, {
        min: value,
        max: value,
        atMin: at,
        atMax: at,
        square: 0,
        last: value,
        lastAt: at,
        firstAt: at,
      });
      return;
    }
    if (value < course.min) {
      course.min = value;
      course.atMin = at;
    }
    if (value > course.max) {
      course.max = value;
      course.atMax = at;
    }
    // The square of a straight line between the points, integrated exactly.
    const { last } = course;
    course.square +=
      (Math.abs(at - course.lastAt) * (last * last + last * value + value * value)) / 3;
    course.last = value;
    course.lastAt = at;
  }

  result(): Record<string, Extreme> {
    return Object.fromEntries(
      [...this.running].map(([name, course]) => {
        const { min, max, atMin, atMax } = course;
        const over = Math.abs(course.lastAt - course.firstAt);
        const rms = over === 0 ? Math.abs(course.last) : Math.sqrt(course.square / over);
        return [name, { min, max, rms, atMin, atMax }];
      }),
    );
  }
}
