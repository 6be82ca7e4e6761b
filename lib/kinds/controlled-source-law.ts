import type { ControlledBy, Law, Site } from "./law";
import { type LinearEntry, linearLaw } from "./linear-law";
import type { Part } from "./part";

/** v(plus) - v(minus) = gain (v(controlPlus) - v(controlMinus)); the current is an unknown. */
export function vcvs(part: Part<"vcvs">, site: Site): Law {
  const { gain } = part.params;
  const controls = [
    { unknown: site.pin("controlPlus"), factor: gain },
    { unknown: site.pin("controlMinus"), factor: -gain },
  ];
  return voltageBy(site, controls, [site.pin("controlPlus"), site.pin("controlMinus")]);
}

/** i(plus into the part) = transconductance (v(controlPlus) - v(controlMinus)). */
export function vccs(part: Part<"vccs">, site: Site): Law {
  const { transconductance } = part.params;
  const controls = [
    { unknown: site.pin("controlPlus"), factor: transconductance },
    { unknown: site.pin("controlMinus"), factor: -transconductance },
  ];
  return currentBy(site, controls, [site.pin("controlPlus"), site.pin("controlMinus")]);
}

/** v(plus) - v(minus) = transresistance × the control current. */
export function ccvs(part: Part<"ccvs">, site: Site): Law {
  return voltageBy(site, scaled(site.controlled, part.params.transresistance), []);
}

/** i(plus into the part) = gain × the control current. */
export function cccs(part: Part<"cccs">, site: Site): Law {
  return currentBy(site, scaled(site.controlled, part.params.gain), []);
}

function scaled(controls: ControlledBy | null, factor: number): ControlledBy {
  return (controls ?? []).map((one) => ({ unknown: one.unknown, factor: one.factor * factor }));
}

function voltageBy(site: Site, controls: ControlledBy, senses: readonly number[]): Law {
  const [plus, minus, current] = [site.pin("plus"), site.pin("minus"), site.current()];
  const own = 2 + senses.length;
  const entries: LinearEntry[] = [
    { row: 0, column: current, g: 1 },
    { row: 1, column: current, g: -1 },
    { row: own, column: plus, g: 1 },
    { row: own, column: minus, g: -1 },
  ];
  for (const { unknown, factor } of controls)
    entries.push({ row: own, column: unknown, g: -factor });
  return linearLaw([plus, minus, ...senses, current], entries, [
    { from: plus, to: minus, tie: "controlsVoltage" },
  ]);
}

function currentBy(site: Site, controls: ControlledBy, senses: readonly number[]): Law {
  const [plus, minus] = [site.pin("plus"), site.pin("minus")];
  const entries = controls.flatMap(({ unknown, factor }) => [
    { row: 0, column: unknown, g: factor },
    { row: 1, column: unknown, g: -factor },
  ]);
  return linearLaw([plus, minus, ...senses], entries, [
    { from: plus, to: minus, tie: "controlsCurrent" },
  ]);
}
