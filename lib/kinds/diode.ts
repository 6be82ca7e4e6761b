import { notNegative, positive } from "../values/range";
import type { KindDescription } from "./description";
import { orNone, type ParameterOf, withDefault } from "./parameter";
import type { Junction } from "./part";

/** The numbers of the junction law, in file order. */
export const junctionParameters: {
  readonly [P in keyof Junction]: ParameterOf<Junction[P]>;
} = {
  saturationCurrent: withDefault("current", 1e-14, positive),
  emissionCoefficient: withDefault("ratio", 1, positive),
  seriesResistance: withDefault("resistance", 0, notNegative),
  breakdownVoltage: orNone("voltage", positive),
  breakdownCurrent: withDefault("current", 1e-3, positive),
  bandgap: withDefault("energy", 1.11, positive),
  saturationTempExponent: withDefault("ratio", 3),
  junctionCapacitance: withDefault("capacitance", 0, notNegative),
  transitTime: withDefault("time", 0, notNegative),
};

/** One description serves the whole diode family: they differ in symbol and ratings alone. */
function junctionKind<K extends "diode" | "zener" | "led" | "schottky">(kind: K) {
  return {
    kind,
    pins: ["anode", "cathode"],
    parameters: junctionParameters,
    fitted: true,
  } as const;
}

export const diode: KindDescription<"diode"> = junctionKind("diode");
export const zener: KindDescription<"zener"> = junctionKind("zener");
export const led: KindDescription<"led"> = junctionKind("led");
export const schottky: KindDescription<"schottky"> = junctionKind("schottky");
