import { stressedQuantities } from "../../kinds/stressed-quantities";
import { partPower, pinCurrents } from "../part-results";
import type { Extreme } from "../solution";
import type { System } from "../system";
import { Extremes } from "./extremes";

/** The extremes of a course: by part and rated quantity, and by net. */
export interface Watched {
  readonly extremes: Readonly<Record<string, Readonly<Record<string, Extreme>>>>;
  readonly netExtremes: Readonly<Record<string, Extreme>>;
}

/** Watches every part and net of a system while it moves. */
export class Watch {
  private readonly nets = new Extremes();
  private readonly parts = new Map<string, Extremes>();

  /**
   * Takes in one point; the system must have been assembled at `x`.
   * @param charging rates of charge by terminal, A, all laws one after the other; null: none
   */
  add(system: System, x: Float64Array, at: number, charging: Float64Array | null): void {
    system.network.unknowns.names.forEach((name, unknown) => {
      if ("net" in name) this.nets.add(name.net, at, x[unknown] ?? 0);
    });
    let offset = 0;
    for (const placed of system.network.parts) {
      const { law, part, pins, temperature } = placed;
      const own = charging?.subarray(offset, offset + law.terminals.length) ?? null;
      offset += law.terminals.length;
      const currents = pinCurrents(placed, own);
      const power = partPower(placed, x, currents);
      const quantities = stressedQuantities(part, {
        pinVoltages: Object.fromEntries(pins.map((pin, t) => [pin, x[law.terminals[t] ?? 0] ?? 0])),
        currents: Object.fromEntries(pins.map((pin, t) => [pin, currents[t] ?? 0])),
        power,
        temperature,
      });
      const course = this.parts.get(part.path) ?? new Extremes();
      this.parts.set(part.path, course);
      for (const [quantity, value] of Object.entries(quantities)) course.add(quantity, at, value);
    }
  }

  result(): Watched {
    const parts = [...this.parts].map(([path, course]) => [path, course.result()] as const);
    return { extremes: Object.fromEntries(parts), netExtremes: this.nets.result() };
  }
}
