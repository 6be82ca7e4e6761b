import type { FlatPart } from "./flatten";

/**
 * The net held at 0 V: the one the file names, or where no fitted part touches that, the net with the most
 * pins, ties going to the first in code-point order.
 */
export function referenceNet(named: string, parts: readonly FlatPart[]): string {
  const pins = new Map<string, number>();
  for (const { pins: nets } of parts) {
    for (const net of nets.values()) {
      if (net !== null) pins.set(net, (pins.get(net) ?? 0) + 1);
    }
  }
  if (pins.size === 0 || pins.has(named)) return named;
  const most = Math.max(...pins.values());
  const [first = named] = inCodePointOrder(
    [...pins.keys()].filter((net) => pins.get(net) === most),
  );
  return first;
}

/** Sorted by code points, which is not the order of UTF-16 code units. */
export function inCodePointOrder(names: readonly string[]): readonly string[] {
  return names
    .map((name) => ({ name, points: [...name].map((character) => character.codePointAt(0) ?? 0) }))
    .sort((left, right) => compare(left.points, right.points))
    .map(({ name }) => name);
}

function compare(left: readonly number[], right: readonly number[]): number {
  const index = left.findIndex((point, position) => point !== right[position]);
  if (index < 0) return left.length - right.length;
  return (left[index] ?? 0) - (right[index] ?? -1);
}
