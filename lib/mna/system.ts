import type { Stage } from "../kinds/law";
import { type Analysis, analyse } from "../numerics/analyse";
import { type Factor, factor } from "../numerics/factor";
import { refactor } from "../numerics/refactor";
import { patternOfEntries, type SparseMatrix, type SparsePattern } from "../numerics/sparse-matrix";
import { fail, ok, type Result } from "../values/result";
import type { Network } from "./network";

/** The symbolic half of a system, kept while the places stay the same. */
interface Structure {
  readonly rows: readonly number[];
  readonly columns: readonly number[];
  readonly pattern: SparsePattern;
  readonly slot: Int32Array;
  analysis: Analysis | null;
  factor: Factor | null;
}

/** What the equations are bent by while something is singular: see `diagnosis.ts`. */
export interface Bent {
  /** Unknowns held at a voltage by 1 S. */
  readonly held: ReadonlyMap<number, number>;
  /** Parts whose own row is replaced by "no current". */
  readonly opened: ReadonlySet<string>;
}

/** Nothing is singular. */
export const unbent: Bent = { held: new Map(), opened: new Set() };

/** The unknown (numbered from 1) at which the matrix has no pivot. */
export interface SingularAt {
  readonly kind: "singular";
  readonly unknowns: readonly number[];
}

/** The equations of one network: residual and matrix at given unknowns, assembled by places chosen once. */
export class System {
  /** Residuals by unknown; 0 collects what returns through the reference. */
  readonly f: Float64Array;
  readonly q: Float64Array;
  readonly stage: Stage = {
    time: null,
    sources: 1,
    helping: 0,
    gainCap: Number.POSITIVE_INFINITY,
    limited: 0,
    switching: false,
    begin: null,
  };
  /** S from every node to the reference, times the distance from `anchor`, while a solution is approached. */
  shunt = 0;
  readonly anchor: Float64Array;
  /** S, that holds bent unknowns. */
  holding = 1;
  /** 1/s: the rate of the charges is `rate` q + `history`, by row; 0: nothing changes in time. */
  rate = 0;
  readonly history: Float64Array;
  readonly matrix: SparseMatrix;
  readonly structure: Structure;
  private readonly openedRow: Uint8Array;

  constructor(
    readonly network: Network,
    readonly bent: Bent,
    before: Structure | null,
  ) {
    const { count } = network.unknowns;
    this.f = new Float64Array(count + 1);
    this.q = new Float64Array(count + 1);
    this.anchor = new Float64Array(count + 1);
    this.history = new Float64Array(count + 1);
    this.structure = structureOf(network, bent, before);
    this.matrix = {
      pattern: this.structure.pattern,
      values: new Float64Array(this.structure.pattern.rowIndex.length + 1),
    };
    this.openedRow = new Uint8Array(count + 1);
    for (const row of openedRows(network, bent)) this.openedRow[row] = 1;
  }

  get size(): number {
    return this.network.unknowns.count;
  }

  /** Fills residuals `f`, charges `q` and the matrix G + rate C at `x` (x[0] is the reference, 0). */
  assemble(x: Float64Array): void {
    const { f, q, stage, openedRow, rate } = this;
    const { values } = this.matrix;
    const { slot } = this.structure;
    f.fill(0);
    q.fill(0);
    values.fill(0);
    stage.limited = 0;
    let entry = 0;
    for (const { law } of this.network.parts) {
      law.evaluate(x, stage);
      const { terminals, rows } = law;
      for (let t = 0; t < terminals.length; t++) {
        const row = terminals[t] ?? 0;
        if (openedRow[row] === 1) continue;
        f[row] = (f[row] ?? 0) + (law.f[t] ?? 0);
        q[row] = (q[row] ?? 0) + (law.q[t] ?? 0);
      }
      for (let k = 0; k < rows.length; k++) {
        const place = slot[entry] ?? 0;
        entry++;
        if (openedRow[rows[k] ?? 0] === 1) continue;
        values[place] = (values[place] ?? 0) + (law.g[k] ?? 0) + rate * (law.c[k] ?? 0);
      }
    }
    stage.begin = null;
    this.bend(x, entry);
  }

  private bend(x: Float64Array, firstEntry: number): void {
    let entry = firstEntry;
    const { f, anchor } = this;
    const { values } = this.matrix;
    const { slot } = this.structure;
    const add = (row: number, conductance: number, current: number): void => {
      const place = slot[entry] ?? 0;
      entry++;
      values[place] = (values[place] ?? 0) + conductance;
      f[row] = (f[row] ?? 0) + current;
    };
    for (const node of this.network.unknowns.nodes) {
      const held = this.bent.held.get(node);
      const holding = held === undefined ? 0 : this.holding;
      const pull =
        this.shunt * ((x[node] ?? 0) - (anchor[node] ?? 0)) +
        holding * ((x[node] ?? 0) - (held ?? 0));
      add(node, this.shunt + holding, pull);
    }
    for (let row = 1; row < this.openedRow.length; row++)
      if (this.openedRow[row] === 1) add(row, 1, x[row] ?? 0);
  }

  /** Factors the matrix, in the old pivot order where that still serves. */
  factorised(): Result<Factor, SingularAt> {
    const { structure, matrix } = this;
    if (structure.factor !== null) {
      const again = refactor(matrix, structure.factor);
      if (again.ok) {
        structure.factor = again.value;
        return again;
      }
      structure.factor = null;
      structure.analysis = null;
    }
    if (structure.analysis === null) {
      const analysed = analyse(matrix);
      if (!analysed.ok)
        return fail({
          kind: "singular",
          unknowns: analysed.error.unmatchedColumns.map((column) => column + 1),
        });
      structure.analysis = analysed.value;
    }
    const made = factor(matrix, structure.analysis);
    if (!made.ok) {
      structure.analysis = null;
      return fail({ kind: "singular", unknowns: [made.error.column + 1] });
    }
    structure.factor = made.value;
    return ok(made.value);
  }
}

function openedRows(network: Network, bent: Bent): readonly number[] {
  return network.parts
    .filter(({ part }) => bent.opened.has(part.path))
    .flatMap(({ law, pins }) => law.terminals[pins.length] ?? []);
}

function structureOf(network: Network, bent: Bent, before: Structure | null): Structure {
  const rows = network.parts.flatMap(({ law }) => [...law.rows]);
  const columns = network.parts.flatMap(({ law }) => [...law.columns]);
  for (const own of [
    ...network.unknowns.nodes,
    ...openedRows(network, bent).toSorted((a, b) => a - b),
  ]) {
    rows.push(own);
    columns.push(own);
  }
  if (before !== null && same(rows, before.rows) && same(columns, before.columns)) return before;
  return {
    rows,
    columns,
    ...compact(network.unknowns.count, rows, columns),
    analysis: null,
    factor: null,
  };
}

/** The pattern without the reference; what falls on it goes to one place behind the last. */
function compact(n: number, rows: readonly number[], columns: readonly number[]) {
  const keptRows: number[] = [];
  const keptColumns: number[] = [];
  const kept: number[] = [];
  rows.forEach((row, entry) => {
    const column = columns[entry] ?? 0;
    if (row === 0 || column === 0) return;
    keptRows.push(row - 1);
    keptColumns.push(column - 1);
    kept.push(entry);
  });
  const { pattern, slot: keptSlot } = patternOfEntries(n, keptRows, keptColumns);
  const slot = new Int32Array(rows.length).fill(pattern.rowIndex.length);
  kept.forEach((entry, k) => {
    slot[entry] = keptSlot[k] ?? 0;
  });
  return { pattern, slot };
}

function same(one: readonly number[], other: readonly number[]): boolean {
  return one.length === other.length && one.every((value, index) => value === other[index]);
}
