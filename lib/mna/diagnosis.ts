import type { DirectPath, Stage } from "../kinds/law";
import { UnionFind } from "../numerics/union-find";
import type { Network, PlacedPart } from "./network";
import type { SolveProblemCode } from "./solution";
import type { Bent } from "./system";
import { loopsOf } from "./voltage-loops";

/** What is wrong with a circuit before any arithmetic, and how to bend it so that the rest can be solved. */
export interface Diagnosis {
  readonly faults: readonly Fault[];
  readonly bent: Bent;
  /** The same bent otherwise: what differs between the two solutions is not determined. */
  readonly otherwise: Bent;
}

export interface Fault {
  readonly code: SolveProblemCode;
  readonly nets: readonly string[];
  readonly parts: readonly string[];
}

/**
 * The same for a system that turned out singular: its undetermined nodes are held, and what then still
 * differs is named. `unknowns` are those without a pivot.
 */
export function diagnoseSingular(
  network: Network,
  before: Diagnosis,
  unknowns: readonly number[],
): Diagnosis {
  const nodes = new Set(network.unknowns.nodes);
  const without = new Set(unknowns);
  const held = new Map(before.bent.held);
  for (const unknown of unknowns) if (nodes.has(unknown)) held.set(unknown, 0);
  if (held.size === before.bent.held.size)
    for (const { law } of network.parts)
      if (law.terminals.some((terminal) => without.has(terminal)))
        for (const terminal of law.terminals) if (nodes.has(terminal)) held.set(terminal, 0);
  return {
    faults: [{ code: "singular", nets: [], parts: [] }],
    bent: { ...before.bent, held },
    otherwise: {
      ...before.otherwise,
      held: new Map([...held.keys()].map((unknown) => [unknown, OTHER_VOLTAGE])),
    },
  };
}

/** V: the other voltage at which floating nets are held. */
const OTHER_VOLTAGE = 1;
/** A: a sum of source currents below this part of the largest is rounding. */
const ROUNDING = 1e-9;

/**
 * Finds nets that nothing holds (union-find over the ways of a direct current) and loops of fixed
 * voltages (a spanning forest). Private nets of `null` pins float without being a fault.
 */
export function diagnose(network: Network, stage: Stage): Diagnosis {
  const paths = network.parts.flatMap((placed) =>
    placed.law.paths.map((path) => ({ placed, path })),
  );
  const faults: Fault[] = [];
  const held = new Map<number, number>();
  const sets = joined(network, paths);
  for (const island of islandsOf(network, sets)) {
    held.set(island[0] ?? 0, 0);
    const fault = faultOf(network, island, stage);
    if (fault !== null) faults.push(fault);
  }
  const opened = new Set<string>();
  const openedOtherwise = new Set<string>();
  for (const loop of loopsOf(network)) {
    if (!loop.harmless) faults.push({ code: "sourcesFight", nets: loop.nets, parts: loop.parts });
    opened.add(loop.closing);
    openedOtherwise.add(loop.parts.find((part) => part !== loop.closing) ?? loop.closing);
  }
  return {
    faults,
    bent: { held, opened },
    otherwise: {
      held: new Map([...held.keys()].map((unknown) => [unknown, OTHER_VOLTAGE])),
      opened: openedOtherwise,
    },
  };
}

function joined(network: Network, paths: readonly { readonly path: DirectPath }[]): UnionFind {
  const sets = new UnionFind(network.unknowns.count + 1);
  for (const { path } of paths) if (path.tie !== "fixesCurrent") sets.join(path.from, path.to);
  return sets;
}

/** The sets of node unknowns that no way joins to the reference. */
function islandsOf(network: Network, sets: UnionFind): readonly (readonly number[])[] {
  const islands = new Map<number, number[]>();
  const grounded = sets.find(0);
  for (const node of network.unknowns.nodes) {
    const root = sets.find(node);
    if (root === grounded) continue;
    const island = islands.get(root) ?? [];
    island.push(node);
    islands.set(root, island);
  }
  return [...islands.values()];
}

/** What is wrong with an island; null where only private nets float. */
function faultOf(network: Network, island: readonly number[], stage: Stage): Fault | null {
  const nets = island.flatMap((unknown) => {
    const name = network.unknowns.names[unknown];
    return name !== undefined && "net" in name ? [name.net] : [];
  });
  if (nets.length === 0) return null;
  const inside = new Set(island);
  const touching = network.parts.filter(({ law, pins }) =>
    pins.some((_, t) => inside.has(law.terminals[t] ?? 0)),
  );
  const sources = touching.filter(({ law }) => law.paths.some(({ tie }) => tie === "fixesCurrent"));
  const currents = sources.map((placed) => currentInto(placed, inside, stage));
  const sum = currents.reduce((total, current) => total + current, 0);
  const largest = Math.max(0, ...currents.map(Math.abs));
  const balanced = Math.abs(sum) <= ROUNDING * largest;
  return balanced
    ? { code: "noPathToReference", nets, parts: touching.map(({ part }) => part.path) }
    : { code: "currentHasNowhereToGo", nets, parts: sources.map(({ part }) => part.path) };
}

/** A, that a current source drives out of the island's nets. */
function currentInto({ law }: PlacedPart, inside: ReadonlySet<number>, stage: Stage): number {
  law.evaluate(new Float64Array(0), stage);
  return law.terminals.reduce(
    (sum, terminal, t) => sum + (inside.has(terminal) ? (law.f[t] ?? 0) : 0),
    0,
  );
}
