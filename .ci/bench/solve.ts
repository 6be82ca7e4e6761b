import { readFileSync } from "node:fs";
import { LuDecomposition, Matrix } from "ml-matrix";
import { readCircuit } from "../../lib/kinds/read-circuit";
import { operatingPoint } from "../../lib/mna/operating-point";
import { solveCircuit } from "../../lib/mna/solve";
import { analyse } from "../../lib/numerics/analyse";
import { factor } from "../../lib/numerics/factor";
import { refactor } from "../../lib/numerics/refactor";
import { solve } from "../../lib/numerics/solve";
import type { SparseMatrix } from "../../lib/numerics/sparse-matrix";
import { interleaved } from "./interleaved";

const ROUNDS = 200;

/**
 * The demo design, Rev C, condition by condition: one linear solve of the solution's own matrix by our
 * sparse LU (in the old pivot order, and from cold) and by ml-matrix's dense LU; then the whole operating
 * point (Newton and all) beside as many dense solves as it took iterations.
 */
export async function benchSolve(): Promise<void> {
  const circuit = readCircuit(readFileSync("tests/kept/ffc-2-C.json", "utf8"));
  if (!circuit.ok) throw new Error("The kept demo file cannot be read");
  write("condition", "unknowns", "dense, ms", "again/dense", "cold/dense", "whole/dense steps");
  for (const condition of circuit.value.conditions) {
    const time = condition.analysis.type === "transient" ? 0 : null;
    const point = operatingPoint(circuit.value, condition, time, null);
    if (point.kept === null || point.certificate === null) continue;
    const { matrix } = point.kept.system;
    const { n } = matrix.pattern;
    const b = Float64Array.from({ length: n }, (_, k) => Math.sin(k + 1));
    const analysis = analyse(matrix);
    if (!analysis.ok) throw new Error("The demo's matrix has no matching");
    const made = factor(matrix, analysis.value);
    if (!made.ok) throw new Error("The demo's matrix has no pivots");
    const dense = denseOf(matrix);
    const column = Matrix.columnVector(Array.from(b));
    const [denseMs = 0, againMs = 0, coldMs = 0, wholeMs = 0] = interleaved(
      [
        () => new LuDecomposition(dense).solve(column),
        () => {
          const again = refactor(matrix, made.value);
          if (again.ok) solve(again.value, b);
        },
        () => {
          const cold = analyse(matrix);
          const factored = cold.ok ? factor(matrix, cold.value) : cold;
          if (factored.ok) solve(factored.value, b);
        },
        () => operatingPoint(circuit.value, condition, time, null),
      ],
      ROUNDS,
    );
    const steps = denseMs * point.certificate.iterations;
    write(
      condition.name,
      String(n),
      denseMs.toFixed(3),
      (againMs / denseMs).toFixed(2),
      (coldMs / denseMs).toFixed(2),
      (wholeMs / steps).toFixed(2),
    );
  }
  const begun = performance.now();
  solveCircuit(circuit.value);
  process.stdout.write(
    `all conditions, the transient too: ${(performance.now() - begun).toFixed(0)} ms\n`,
  );
}

function denseOf(matrix: SparseMatrix): Matrix {
  const { n, columnStart, rowIndex } = matrix.pattern;
  const dense = Matrix.zeros(n, n);
  for (let column = 0; column < n; column++)
    for (let p = columnStart[column] ?? 0; p < (columnStart[column + 1] ?? 0); p++)
      dense.set(rowIndex[p] ?? 0, column, matrix.values[p] ?? 0);
  return dense;
}

function write(...cells: readonly string[]): void {
  const [name = "", ...rest] = cells;
  process.stdout.write(`${name.padEnd(18)}${rest.map((cell) => cell.padStart(18)).join("")}\n`);
}
