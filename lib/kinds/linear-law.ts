import { type DirectPath, emptyLaw, type Law, Places, type Stage } from "./law";

/** One entry of a linear law: `f[row] += g x[column]`, `q[row] += c x[column]`; rows are terminal numbers. */
export interface LinearEntry {
  readonly row: number;
  /** Unknown. */
  readonly column: number;
  readonly g: number;
  readonly c?: number;
}

/** A drive: `f[row] += factor * value(stage)`. */
export interface Drive {
  readonly row: number;
  readonly value: (at: Stage) => number;
}

/** A law whose derivatives are constant. */
export function linearLaw(
  terminals: readonly number[],
  entries: readonly LinearEntry[],
  paths: readonly DirectPath[],
  drives: readonly Drive[] = [],
): Law {
  const places = new Places();
  for (const entry of entries) places.add(terminals[entry.row] ?? 0, entry.column);
  const law = emptyLaw(terminals, places);
  const { f, q, g, c } = law;
  entries.forEach((entry, k) => {
    g[k] = entry.g;
    c[k] = entry.c ?? 0;
  });
  const row = Int32Array.from(entries, (entry) => entry.row);
  const column = Int32Array.from(entries, (entry) => entry.column);
  const evaluate = (x: Float64Array, at: Stage): void => {
    f.fill(0);
    q.fill(0);
    for (let k = 0; k < row.length; k++) {
      const value = x[column[k] ?? 0] ?? 0;
      const r = row[k] ?? 0;
      f[r] = (f[r] ?? 0) + (g[k] ?? 0) * value;
      q[r] = (q[r] ?? 0) + (c[k] ?? 0) * value;
    }
    for (const drive of drives) f[drive.row] = (f[drive.row] ?? 0) + drive.value(at);
  };
  return { ...law, linear: true, evaluate, paths };
}
