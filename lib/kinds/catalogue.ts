import { bjt } from "./bjt";
import { capacitor } from "./capacitor";
import { cccs } from "./cccs";
import { ccvs } from "./ccvs";
import { comparator } from "./comparator";
import { connector } from "./connector";
import { coupling } from "./coupling";
import { currentSource } from "./current-source";
import type { KindDescription } from "./description";
import { diode, led, schottky, zener } from "./diode";
import { fuse } from "./fuse";
import { inductor } from "./inductor";
import { jfet } from "./jfet";
import { lamp } from "./lamp";
import { linearRegulator } from "./linear-regulator";
import { mosfet } from "./mosfet";
import { opAmp } from "./op-amp";
import { optocoupler } from "./optocoupler";
import type { Parameter } from "./parameter";
import type { Kind } from "./part";
import { potentiometer } from "./potentiometer";
import { relayCoil } from "./relay-coil";
import { resistor } from "./resistor";
import { switchKind } from "./switch";
import { testPoint } from "./test-point";
import { thermistor } from "./thermistor";
import { transformer } from "./transformer";
import { vccs } from "./vccs";
import { vcvs } from "./vcvs";
import { voltageReference } from "./voltage-reference";
import { voltageSource } from "./voltage-source";

/** Every part kind. A kind without a row here does not compile. */
export const catalogue: { readonly [K in Kind]: KindDescription<K> } = {
  resistor,
  capacitor,
  inductor,
  coupling,
  voltageSource,
  currentSource,
  vcvs,
  vccs,
  ccvs,
  cccs,
  diode,
  zener,
  led,
  schottky,
  bjt,
  mosfet,
  jfet,
  opAmp,
  comparator,
  switch: switchKind,
  thermistor,
  potentiometer,
  fuse,
  relayCoil,
  lamp,
  linearRegulator,
  voltageReference,
  optocoupler,
  transformer,
  connector,
  testPoint,
};

/** The kinds, in the order of the catalogue. */
export const kinds: readonly Kind[] = Object.values(catalogue).map((row) => row.kind);

/** A parameter of a kind by name; undefined where it has none of that name. */
export function parameterOf(kind: Kind, name: string): Parameter | undefined {
  return new Map<string, Parameter>(Object.entries(catalogue[kind].parameters)).get(name);
}
