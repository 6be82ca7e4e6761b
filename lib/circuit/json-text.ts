import type { FileProblem } from "../values/problem";
import { fail, ok, type Result } from "../values/result";
import { DEEPEST } from "./plain-json";
import { below } from "./pointer";

/** The longest text that is read, in UTF-16 code units. */
const LONGEST = 32 * 1024 * 1024;
const NUMBER = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
/** From the space on, all but the quotation mark and the reverse solidus. */
const PLAIN_CHARACTERS = /[ !#-[\]-\uFFFF]*/y;
const BLANKS = /[ \t\n\r]*/y;
const LINE_END = /\r\n|\n|\r/g;
const ESCAPES: ReadonlyMap<string, string> = new Map([
  ['"', '"'],
  ["\\", "\\"],
  ["/", "/"],
  ["b", "\b"],
  ["f", "\f"],
  ["n", "\n"],
  ["r", "\r"],
  ["t", "\t"],
]);

/** Thrown and caught in this file alone: where the text stops being JSON, or is nested too deeply. */
class Stop extends Error {
  constructor(readonly problem: FileProblem) {
    super(problem.message);
  }
}

/** A parsed text, and the keys that stand in it twice: the first of each counts. */
export interface ParsedJson {
  readonly value: unknown;
  readonly duplicates: readonly FileProblem[];
}

/**
 * Parses JSON (RFC 8259). Unlike `JSON.parse` it says line and column where the text is no JSON,
 * reports keys written twice, and keeps `__proto__` as the ordinary key it is. A byte-order mark is passed over.
 */
export function parseJson(text: string): Result<ParsedJson, FileProblem> {
  if (text.length > LONGEST) {
    const message = `The file has more than ${LONGEST} characters; it is too large to be read.`;
    return fail({ code: "tooLarge", message, at: "" });
  }
  try {
    const scanner = new Scanner(text.startsWith("\uFEFF") ? text.slice(1) : text);
    const value = scanner.document();
    return ok({ value, duplicates: scanner.duplicates });
  } catch (stop) {
    if (stop instanceof Stop) return fail(stop.problem);
    throw stop;
  }
}

class Scanner {
  readonly duplicates: FileProblem[] = [];
  #at = 0;

  constructor(readonly text: string) {}

  document(): unknown {
    this.#skip(BLANKS);
    if (this.#at === this.text.length) this.#stop("The file is empty; it must hold a JSON object");
    const value = this.#value("", 1);
    this.#skip(BLANKS);
    if (this.#at < this.text.length) this.#stop("Nothing may follow after the end of the JSON");
    return value;
  }

  #value(pointer: string, depth: number): unknown {
    const first = this.text[this.#at];
    if (first === "{" || first === "[") {
      if (depth > DEEPEST) this.#tooDeep(pointer);
      return first === "{" ? this.#object(pointer, depth) : this.#list(pointer, depth);
    }
    if (first === '"') return this.#string();
    for (const [word, value] of [
      ["true", true],
      ["false", false],
      ["null", null],
    ] as const) {
      if (this.text.startsWith(word, this.#at)) {
        this.#at += word.length;
        return value;
      }
    }
    const number = this.#skip(NUMBER);
    if (number === "")
      this.#stop("A value is missing or is written in a way that JSON does not have");
    return Number(number);
  }

  #object(pointer: string, depth: number): unknown {
    const members = new Map<string, unknown>();
    this.#at += 1;
    this.#skip(BLANKS);
    if (this.#take("}")) return {};
    do {
      this.#skip(BLANKS);
      if (this.text[this.#at] !== '"') this.#stop("A key in quotation marks is missing");
      const key = this.#string();
      const member = below(pointer, key);
      this.#skip(BLANKS);
      if (!this.#take(":")) this.#stop('A ":" is missing after the key');
      this.#skip(BLANKS);
      const value = this.#value(member, depth + 1);
      if (members.has(key)) {
        const message = `The key ${JSON.stringify(key)} stands here twice; keep one.`;
        this.duplicates.push({ code: "duplicateKey", message, at: member });
      } else {
        members.set(key, value);
      }
      this.#skip(BLANKS);
    } while (this.#take(","));
    if (!this.#take("}")) this.#stop('A "," or "}" is missing');
    return Object.fromEntries(members);
  }

  #list(pointer: string, depth: number): unknown[] {
    const items: unknown[] = [];
    this.#at += 1;
    this.#skip(BLANKS);
    if (this.#take("]")) return items;
    do {
      this.#skip(BLANKS);
      items.push(this.#value(below(pointer, items.length), depth + 1));
      this.#skip(BLANKS);
    } while (this.#take(","));
    if (!this.#take("]")) this.#stop('A "," or "]" is missing');
    return items;
  }

  #string(): string {
    this.#at += 1;
    let text = "";
    for (;;) {
      text += this.#skip(PLAIN_CHARACTERS);
      if (this.#take('"')) return text;
      if (!this.#take("\\")) {
        this.#stop(
          this.#at === this.text.length
            ? "The quotation mark that ends the text is missing"
            : "A control character must be written as an escape here",
        );
      }
      text += this.#escape();
    }
  }

  #escape(): string {
    const letter = this.text[this.#at] ?? "";
    const plain = ESCAPES.get(letter);
    if (plain !== undefined) {
      this.#at += 1;
      return plain;
    }
    const digits = this.text.slice(this.#at + 1, this.#at + 5);
    if (letter !== "u" || !/^[0-9a-fA-F]{4}$/.test(digits)) this.#stop("JSON has no such escape");
    this.#at += 5;
    return String.fromCharCode(Number.parseInt(digits, 16));
  }

  #take(character: string): boolean {
    if (this.text[this.#at] !== character) return false;
    this.#at += 1;
    return true;
  }

  #skip(pattern: RegExp): string {
    pattern.lastIndex = this.#at;
    const [matched = ""] = pattern.exec(this.text) ?? [];
    this.#at += matched.length;
    return matched;
  }

  #stop(what: string): never {
    const lines = this.text.slice(0, this.#at).split(LINE_END);
    const column = [...(lines.at(-1) ?? "")].length + 1;
    const at = `line ${lines.length}, column ${column}`;
    throw new Stop({ code: "notJson", message: `${what} (${at}).`, at });
  }

  #tooDeep(pointer: string): never {
    const message = `The file is nested more than ${DEEPEST} deep here; nothing in it needs that.`;
    throw new Stop({ code: "tooLarge", message, at: pointer });
  }
}
