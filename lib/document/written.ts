import type {
  FileAnalysis,
  FileCondition,
  FileParameter,
  FilePart,
  FilePolicy,
  WrittenValue,
} from "../circuit/circuit-file";
import { objectOf } from "./plain";

/*
 * A document may hold anything that some writer put there. These predicates let through what has the
 * outline of a circuit file's member; whether its inside makes sense is for the file's reader to say,
 * with the place, so that a half-typed value is shown and not lost.
 */

export function isWrittenValue(value: unknown): value is WrittenValue {
  return typeof value === "string" || (typeof value === "number" && Number.isFinite(value));
}

export function isParameter(value: unknown): value is FileParameter {
  if (value === null || typeof value === "boolean" || isWrittenValue(value)) return true;
  const object = objectOf(value);
  return (
    object !== null &&
    ["pulse", "sine", "points", "step"].some((shape) => typeof object[shape] === "object")
  );
}

export function isAnalysis(value: unknown): value is FileAnalysis {
  const type = objectOf(value)?.["type"];
  return (
    type === "operatingPoint" ||
    type === "sweep" ||
    type === "frequencyResponse" ||
    type === "transient"
  );
}

export function isStart(value: unknown): value is NonNullable<FileCondition["start"]> {
  return objectOf(objectOf(value)?.["nets"]) !== null;
}

export function isSpread(value: unknown): value is NonNullable<FileCondition["spread"]> {
  return typeof objectOf(value)?.["method"] === "string";
}

export function isThermal(value: unknown): value is NonNullable<FilePart["thermal"]> {
  return isWrittenValue(objectOf(value)?.["junctionToAmbient"]);
}

export function isFit(value: unknown): value is NonNullable<FilePart["fit"]> {
  return Array.isArray(value) && value.every((point) => objectOf(point) !== null);
}

export function isDrift(value: unknown): value is NonNullable<FilePart["drift"]> {
  return objectOf(value) !== null;
}

export function isPolicy(value: unknown): value is FilePolicy {
  return objectOf(value) !== null;
}

/** The members that a predicate lets through, keys sorted. */
export function membersThat<T>(
  members: Readonly<Record<string, unknown>>,
  accepts: (value: unknown) => value is T,
): Readonly<Record<string, T>> {
  const kept: [string, T][] = [];
  for (const [key, value] of Object.entries(members)) if (accepts(value)) kept.push([key, value]);
  return Object.fromEntries(kept);
}
