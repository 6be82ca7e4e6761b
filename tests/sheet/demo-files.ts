import { readdirSync, readFileSync } from "node:fs";
import type { CircuitFile } from "../../lib/circuit/circuit-file";

const FOLDER = new URL("../../prisma/demo/", import.meta.url);

/** The circuit files that the demonstration workspace starts with, by file name. */
export function demoFiles(): readonly (readonly [string, CircuitFile])[] {
  return readdirSync(FOLDER)
    .filter((name) => name.endsWith(".json"))
    .map((name) => [name, JSON.parse(readFileSync(new URL(name, FOLDER), "utf8"))]);
}
