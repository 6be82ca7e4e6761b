import type { Waveform } from "../circuit/analysis";
import type { Law, Site, Stage } from "./law";
import { linearLaw } from "./linear-law";
import type { Part } from "./part";
import { waveformValue } from "./waveform-value";

/** A source's value: `dc` in an operating point, its waveform (if it has one) in a transient. */
function drive(dc: number, waveform: Waveform | null): (at: Stage) => number {
  return (at) =>
    at.sources * (at.time === null || waveform === null ? dc : waveformValue(waveform, at.time));
}

/** v(plus) - v(minus) = E; the current is an unknown. */
export function voltageSource(part: Part<"voltageSource">, site: Site): Law {
  const [plus, minus, current] = [site.pin("plus"), site.pin("minus"), site.current()];
  const value = drive(part.params.dc, part.params.waveform);
  return linearLaw(
    [plus, minus, current],
    [
      { row: 0, column: current, g: 1 },
      { row: 1, column: current, g: -1 },
      { row: 2, column: plus, g: 1 },
      { row: 2, column: minus, g: -1 },
    ],
    [{ from: plus, to: minus, tie: "fixesVoltage" }],
    [{ row: 2, value: (at) => -value(at) }],
  );
}

/** The current leaves the net at `from` and enters the net at `to`. */
export function currentSource(part: Part<"currentSource">, site: Site): Law {
  const [from, to] = [site.pin("from"), site.pin("to")];
  const value = drive(part.params.dc, part.params.waveform);
  return linearLaw(
    [from, to],
    [],
    [{ from, to, tie: "fixesCurrent" }],
    [
      { row: 0, value },
      { row: 1, value: (at) => -value(at) },
    ],
  );
}
