import * as Y from "yjs";

/** Readers of what a document may hold: any writer may have written anything, so each gives null for another shape. */

export function textOf(value: unknown): string | null {
  return typeof value === "string" ? value : null;
}

export function numberOf(value: unknown): number | null {
  return typeof value === "number" && Number.isFinite(value) ? value : null;
}

export function objectOf(value: unknown): Readonly<Record<string, unknown>> | null {
  if (typeof value !== "object" || value === null || Array.isArray(value)) return null;
  if (value instanceof Y.AbstractType) return null;
  return Object.fromEntries(Object.entries(value));
}

export function pointOf(value: unknown): readonly [number, number] | null {
  if (!Array.isArray(value)) return null;
  const x = numberOf(value[0]);
  const y = numberOf(value[1]);
  return x === null || y === null ? null : [x, y];
}

/** A map's members as a plain object, keys sorted, so that the same state gives the same bytes. */
export function membersOf(value: unknown): Readonly<Record<string, unknown>> {
  const entries =
    value instanceof Y.Map ? [...value.entries()] : Object.entries(objectOf(value) ?? {});
  return Object.fromEntries(
    entries
      .filter(([, member]) => member !== undefined && !(member instanceof Y.AbstractType))
      .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0)),
  );
}
