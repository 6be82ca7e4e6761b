import { readFile } from "node:fs/promises";
import { compare, type Side } from "../comparison/compare";
import { readSide } from "../comparison/read-side";
import type { FileProblem } from "../values/problem";
import { fail, type Result } from "../values/result";

/** `npm run --silent compare -- BASE PROPOSED`: exit 0, 1 where a side has no solution, 2 for a bad file. */
async function main(files: readonly string[]): Promise<number> {
  const [base, proposed] = await Promise.all([sideOf(files[0], "/0"), sideOf(files[1], "/1")]);
  if (!base.ok || !proposed.ok) {
    const problems = [...(base.ok ? [] : base.error), ...(proposed.ok ? [] : proposed.error)];
    print({ ampersignComparison: 1, problems });
    return 2;
  }
  const comparison = compare(base.value, proposed.value);
  print(comparison);
  return comparison.problems.some(({ code }) => !code.startsWith("edits")) ? 1 : 0;
}

async function sideOf(
  file: string | undefined,
  at: string,
): Promise<Result<Side, readonly FileProblem[]>> {
  if (file === undefined)
    return fail([unreadable("Name two files: npm run --silent compare -- BASE PROPOSED", at)]);
  const text = await readFile(file, "utf8").catch(() => null);
  return text === null ? fail([unreadable(`${file} cannot be read.`, at)]) : readSide(text);
}

function unreadable(message: string, at: string): FileProblem {
  return { code: "unreadable", message, at };
}

function print(value: unknown): void {
  process.stdout.write(`${JSON.stringify(value, null, 1)}\n`);
}

process.exitCode = await main(process.argv.slice(2));
