import { readCircuitFile } from "../../lib/kinds/read-circuit";

/** Code and place of every problem of a file, in the order told. */
export function problemsOf(file: unknown): readonly string[] {
  const read = readCircuitFile(file);
  return read.ok ? [] : read.error.map(({ code, at }) => `${code} ${at}`);
}
