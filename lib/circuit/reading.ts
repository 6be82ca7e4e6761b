import type { FileProblem, FileProblemCode } from "../values/problem";

/** More problems than this help nobody; the last row then says that there are more. */
const MOST_PROBLEMS = 1000;

/** What the written values of a file read as. */
export interface ReadValues {
  /** The number of each value, by JSON Pointer. */
  readonly values: ReadonlyMap<string, number>;
  /** Members that stand in another form, by the pointer of the object they belong to. */
  readonly additions: ReadonlyMap<string, ReadonlyMap<string, unknown>>;
}

/**
 * What one reading of a file gathers besides its result: every problem, and the number that each written
 * value stands for, by JSON Pointer. One per call of the reader; nothing outlives it.
 */
export class Reading implements ReadValues {
  readonly #problems: FileProblem[] = [];
  readonly #values = new Map<string, number>();
  readonly #additions = new Map<string, Map<string, unknown>>();
  #left = 0;

  report(code: FileProblemCode, message: string, at: string): void {
    if (this.#problems.length < MOST_PROBLEMS) this.#problems.push({ code, message, at });
    else this.#left += 1;
  }

  /** Notes what the value at the pointer reads as. */
  note(at: string, value: number): void {
    this.#values.set(at, value);
  }

  /** Notes a member that the object at the pointer says in another way: the tolerance of a letter code. */
  add(holder: string, key: string, value: unknown): void {
    const members = this.#additions.get(holder) ?? new Map<string, unknown>();
    this.#additions.set(holder, members.set(key, value));
  }

  get problems(): readonly FileProblem[] {
    if (this.#left === 0) return this.#problems;
    const message = `There are ${this.#left} more problems; mend these first.`;
    return [...this.#problems, { code: "tooLarge", message, at: "" }];
  }

  get values(): ReadonlyMap<string, number> {
    return this.#values;
  }

  get additions(): ReadonlyMap<string, ReadonlyMap<string, unknown>> {
    return this.#additions;
  }
}
