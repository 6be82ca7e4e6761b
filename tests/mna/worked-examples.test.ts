import { readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { readCircuitFile } from "../../lib/kinds/read-circuit";
import type { ConditionResult } from "../../lib/mna/solution";
import { solveCircuit } from "../../lib/mna/solve";

interface Row {
  readonly condition: string;
  readonly path: string;
  readonly value?: number;
  readonly equals?: unknown;
  readonly abs?: number;
  readonly rel?: number;
  readonly at?: number;
}

interface Example {
  readonly id: string;
  readonly title: string;
  readonly source: string;
  readonly status: string;
  readonly circuit: unknown;
  readonly expect: readonly Row[];
}

const examples: readonly Example[] = JSON.parse(readFileSync("tests/kept/examples.json", "utf8"));

/** Examples that need a frequency response or a spread: the engine says so itself. */
const notYetSolved: readonly string[] = [
  "tol-extreme-value",
  "tol-extreme-uneven",
  "tol-nonmonotone",
  ...examples.map(({ id }) => id).filter((id) => id.startsWith("ac-")),
];

const refused: string[] = [];

for (const { id, title, source, status, circuit: file, expect: rows } of examples) {
  it(`${id}: ${title} [${status}: ${source}]`, () => {
    const circuit = readCircuitFile(file);
    if (!circuit.ok) throw new Error(JSON.stringify(circuit.error));
    const solved = solveCircuit(circuit.value);
    if (solved.problems.some(({ code }) => code === "notYetSolved")) {
      refused.push(id);
      expect(notYetSolved).toContain(id);
      return;
    }
    expect(rows.length).toBeGreaterThan(0);
    for (const row of rows) {
      const condition = solved.conditions.find(({ name }) => name === row.condition);
      const found = condition === undefined ? undefined : valueAt(condition, row);
      const where = `${row.condition}: ${row.path}${row.at === undefined ? "" : ` at ${row.at}`}`;
      if (row.equals !== undefined) {
        expect(found, where).toBe(row.equals);
        continue;
      }
      const wanted = row.value ?? Number.NaN;
      const allowed = Math.max(row.abs ?? 0, (row.rel ?? 0) * Math.abs(wanted));
      expect(Math.abs(Number(found) - wanted), where).toBeLessThanOrEqual(allowed);
    }
  });
}

it(`cannot solve yet, by name: ${notYetSolved.join(", ")}`, () => {
  expect(refused.toSorted()).toEqual([...notYetSolved].toSorted());
});

/** The value at a path of a condition's result; of a course, at a place between its points. */
function valueAt(condition: ConditionResult, row: Row): unknown {
  let value: unknown = condition;
  for (const key of row.path.split(".")) value = Object(value)[key];
  if (row.at === undefined) return value;
  const grid = condition.transient?.time ?? condition.sweep?.values ?? [];
  const course: unknown[] = Array.isArray(value) ? value : [];
  const next = grid.findIndex((place) => place >= (row.at ?? 0));
  if (next <= 0) return course[Math.max(next, 0)];
  const [low, high] = [grid[next - 1] ?? 0, grid[next] ?? 0];
  const part = (row.at - low) / (high - low);
  return Number(course[next - 1]) * (1 - part) + Number(course[next]) * part;
}
