import type { FileProblem } from "../values/problem";
import { below } from "./pointer";

/** Objects and lists inside one another; the outermost counts one. */
export const DEEPEST = 200;

/**
 * What keeps a value from being JSON that every program reads alike: functions and the like, numbers
 * that are not finite, texts with half a surrogate pair (RFC 8785 has no form for either), nesting too deep.
 */
export function problemsOfJson(value: unknown): readonly FileProblem[] {
  const problems: FileProblem[] = [];
  visit(value, "", 1, problems);
  return problems;
}

function visit(value: unknown, at: string, depth: number, problems: FileProblem[]): void {
  if (value === null || typeof value === "boolean") return;
  if (typeof value === "number") {
    if (Number.isFinite(value)) return;
    const message = "The number is not finite; write one that is.";
    problems.push({ code: "badValue", message, at });
  } else if (typeof value === "string") {
    checkText(value, at, problems);
  } else if (typeof value === "object") {
    visitMembers(value, at, depth, problems);
  } else {
    const message = `JSON has nothing for ${typeof value}; leave the key out.`;
    problems.push({ code: "wrongType", message, at });
  }
}

function visitMembers(value: object, at: string, depth: number, problems: FileProblem[]): void {
  // Once too deep, nothing more is worth telling; an object that holds itself would never end.
  if (problems.at(-1)?.code === "tooLarge") return;
  if (depth > DEEPEST) {
    const message = `The file is nested more than ${DEEPEST} deep here; nothing in it needs that.`;
    problems.push({ code: "tooLarge", message, at });
    return;
  }
  if (Array.isArray(value)) {
    value.forEach((item: unknown, index) => {
      visit(item, below(at, index), depth + 1, problems);
    });
    return;
  }
  for (const [key, member] of Object.entries(value)) {
    const pointer = below(at, key);
    checkText(key, pointer, problems);
    visit(member, pointer, depth + 1, problems);
  }
}

function checkText(text: string, at: string, problems: FileProblem[]): void {
  if (!/\p{Surrogate}/u.test(text)) return;
  const message = "The text has half a surrogate pair; write whole characters.";
  problems.push({ code: "badValue", message, at });
}
