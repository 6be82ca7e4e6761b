import type { FileBlock } from "../circuit/circuit-file";
import type { WireEnd } from "../circuit/drawing";

/** What hangs together by wires on a sheet, and the net that its pins and labels name. */
export interface Clusters {
  /** A cluster's number for each end; ends in one cluster are wired to one another. */
  clusterOf(end: WireEnd): number;
  /** The net of a cluster; null where nothing names one. */
  netOf(end: WireEnd): string | null;
}

/** The name of an end, one for each place of the drawing. */
export function endKey(end: WireEnd): string {
  return "junction" in end ? `junction ${end.junction}` : `pin ${end.part}\u0000${end.pin}`;
}

/** Joins wire ends that meet; the net comes from the first pin, else the first label, of the cluster. */
export function clusters(block: FileBlock): Clusters {
  const parents = new Map<string, string>();
  const root = (key: string): string => {
    const parent = parents.get(key);
    if (parent === undefined || parent === key) return key;
    const top = root(parent);
    parents.set(key, top);
    return top;
  };
  const nets = new Map<string, string>();
  const numbers = new Map<string, number>();
  for (const { a, b } of block.wires ?? []) parents.set(root(endKey(a)), root(endKey(b)));
  const name = (end: WireEnd, net: string | null | undefined): void => {
    const key = root(endKey(end));
    if (net !== null && net !== undefined && !nets.has(key)) nets.set(key, net);
  };
  for (const part of block.parts) {
    for (const [pin, net] of Object.entries(part.pins ?? {})) name({ part: part.ref, pin }, net);
  }
  for (const label of block.sheet?.labels ?? []) name(label.end, label.net);
  return {
    clusterOf(end) {
      const key = root(endKey(end));
      const number = numbers.get(key) ?? numbers.size;
      numbers.set(key, number);
      return number;
    },
    netOf: (end) => nets.get(root(endKey(end))) ?? null,
  };
}
