import type { Diagnosis } from "./diagnosis";
import type { Network } from "./network";
import type { Reading } from "./part-results";
import type { PartResult } from "./solution";

/** Beyond this part of its size (or this many V or A) a value differs between two solutions. */
const SAME_WITHIN = 1e-6;

/** What two solutions agree on: the rest is not determined, and null. */
export function undetermined(
  one: Reading,
  other: Reading,
  diagnosis: Diagnosis,
  network: Network,
): Reading {
  const floating = new Set<string>();
  for (const fault of diagnosis.faults)
    if (fault.code !== "sourcesFight") for (const net of fault.nets) floating.add(net);
  const unknownCurrents = new Set<string>();
  for (const fault of diagnosis.faults)
    if (fault.code === "sourcesFight") for (const part of fault.parts) unknownCurrents.add(part);

  const nets = Object.entries(one.nets).map(([net, value]): [string, number | null] => [
    net,
    floating.has(net) ? null : agreed(value, other.nets[net] ?? null),
  ]);
  const known = new Map(nets);
  const parts = network.parts.map(({ part }): [string, PartResult] => {
    const result = one.parts[part.path];
    const twin = other.parts[part.path];
    if (result === undefined || twin === undefined) throw new Error(`${part.path} has no result`);
    const dark =
      unknownCurrents.has(part.path) ||
      Object.values(part.pins).some((net) => net !== null && known.get(net) === null);
    const currents = Object.entries(result.currents).map(
      ([pin, current]): [string, number | null] => [
        pin,
        dark ? null : agreed(current, twin.currents[pin] ?? null),
      ],
    );
    return [
      part.path,
      {
        voltage: agreed(result.voltage, twin.voltage),
        power: dark ? null : agreed(result.power, twin.power),
        currents: Object.fromEntries(currents),
        temperature: result.temperature,
      },
    ];
  });
  return { nets: Object.fromEntries(nets), parts: Object.fromEntries(parts) };
}

function agreed(one: number | null, other: number | null): number | null {
  if (one === null || other === null) return null;
  const size = Math.max(Math.abs(one), Math.abs(other));
  return Math.abs(one - other) <= SAME_WITHIN * size + 1e-12 ? one : null;
}
