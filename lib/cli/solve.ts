import { readFile } from "node:fs/promises";
import { readCircuit } from "../kinds/read-circuit";
import { judge } from "../stress/judge";
import type { FileProblem } from "../values/problem";

/**
 * `npm run --silent solve -- FILE [--all]`: parse, solve, judge, print. Exit 0: every condition is solved
 * (limits and stress may fail); 1: one is not; 2: the file is bad. `--all` has a stress row for each condition.
 */
async function main(args: readonly string[]): Promise<number> {
  const files = args.filter((arg) => !arg.startsWith("--"));
  const options = args.filter((arg) => arg.startsWith("--"));
  const [file] = files;
  if (file === undefined || files.length > 1 || options.some((option) => option !== "--all"))
    return refuse([unreadable("Name one circuit file: npm run --silent solve -- FILE [--all]")]);
  const text = await readText(file);
  if (text === null) return refuse([unreadable(`${file} cannot be read as text; check its name.`)]);
  const circuit = readCircuit(text);
  if (!circuit.ok) return refuse(circuit.error);
  const result = judge(circuit.value, { everyCondition: options.includes("--all") });
  print(result);
  return result.conditions.every(({ status }) => status === "solved") ? 0 : 1;
}

/** The file as UTF-8; null where it is not there or is something else. */
async function readText(file: string): Promise<string | null> {
  const bytes = await readFile(file).catch(() => null);
  if (bytes === null) return null;
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    return null;
  }
}

function unreadable(message: string): FileProblem {
  return { code: "unreadable", message, at: "" };
}

function refuse(problems: readonly FileProblem[]): number {
  print({ ampersignResult: 1, problems });
  return 2;
}

/** JSON has no infinite numbers: they are printed as null. */
function print(value: unknown): void {
  process.stdout.write(`${JSON.stringify(value, null, 1)}\n`);
}

process.exitCode = await main(process.argv.slice(2));
