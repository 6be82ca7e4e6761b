import type { Kind } from "../../lib/kinds/part";

/** Every part kind in the drawer's short words, and under which heading it stands. */
export const kindWords: Readonly<
  Record<Kind, { readonly name: string; readonly group: KindGroup }>
> = {
  voltageSource: { name: "voltage", group: "sources" },
  currentSource: { name: "current", group: "sources" },
  vcvs: { name: "V by V", group: "sources" },
  vccs: { name: "I by V", group: "sources" },
  ccvs: { name: "V by I", group: "sources" },
  cccs: { name: "I by I", group: "sources" },
  resistor: { name: "resistor", group: "passive" },
  capacitor: { name: "capacitor", group: "passive" },
  inductor: { name: "inductor", group: "passive" },
  coupling: { name: "coupling", group: "passive" },
  thermistor: { name: "thermistor", group: "passive" },
  potentiometer: { name: "potentiometer", group: "passive" },
  transformer: { name: "transformer", group: "passive" },
  diode: { name: "diode", group: "semiconductors" },
  zener: { name: "zener", group: "semiconductors" },
  schottky: { name: "Schottky", group: "semiconductors" },
  led: { name: "LED", group: "semiconductors" },
  bjt: { name: "bipolar", group: "semiconductors" },
  mosfet: { name: "MOSFET", group: "semiconductors" },
  jfet: { name: "JFET", group: "semiconductors" },
  opAmp: { name: "op-amp", group: "semiconductors" },
  comparator: { name: "comparator", group: "semiconductors" },
  optocoupler: { name: "optocoupler", group: "semiconductors" },
  linearRegulator: { name: "regulator", group: "semiconductors" },
  voltageReference: { name: "reference", group: "semiconductors" },
  switch: { name: "switch", group: "electromechanical" },
  relayCoil: { name: "relay coil", group: "electromechanical" },
  fuse: { name: "fuse", group: "electromechanical" },
  lamp: { name: "lamp", group: "electromechanical" },
  connector: { name: "connector", group: "electromechanical" },
  testPoint: { name: "test point", group: "electromechanical" },
};

export type KindGroup = "sources" | "passive" | "semiconductors" | "electromechanical";

export const kindGroups: readonly { readonly group: KindGroup; readonly words: string }[] = [
  { group: "sources", words: "Sources" },
  { group: "passive", words: "Passive" },
  { group: "semiconductors", words: "Semiconductors" },
  { group: "electromechanical", words: "Electromechanical" },
];
