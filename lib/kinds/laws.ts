import { bjt } from "./bjt-law";
import { capacitor } from "./capacitor-law";
import { comparator } from "./comparator-law";
import { cccs, ccvs, vccs, vcvs } from "./controlled-source-law";
import { diode } from "./diode-law";
import { coupling, inductor, relayCoil } from "./inductor-law";
import { jfet } from "./jfet-law";
import { lamp } from "./lamp-law";
import type { Law, Site } from "./law";
import { linearLaw } from "./linear-law";
import { mosfet } from "./mosfet-law";
import { opAmp } from "./op-amp-law";
import type { Kind, Part } from "./part";
import { potentiometer } from "./potentiometer-law";
import { fuse, resistor, thermistor } from "./resistor-law";
import { currentSource, voltageSource } from "./source-law";
import { switchLaw } from "./switch-law";
import { transformer } from "./transformer-law";

/** Pins that carry no current, whatever they are called. */
function none(part: Part<"connector" | "testPoint">, site: Site): Law {
  return linearLaw(Object.keys(part.pins).map(site.pin), [], []);
}

/** The law of every kind; null: the kind cannot be solved yet. */
const laws: { readonly [K in Kind]: ((part: Part<K>, site: Site) => Law) | null } = {
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
  zener: diode,
  led: diode,
  schottky: diode,
  bjt,
  mosfet,
  jfet,
  opAmp,
  comparator,
  switch: switchLaw,
  thermistor,
  potentiometer,
  fuse,
  relayCoil,
  lamp,
  linearRegulator: null,
  voltageReference: null,
  optocoupler: null,
  transformer,
  connector: none,
  testPoint: none,
};

/** The law of a part where it stands. */
export function lawOf<K extends Kind>(part: Part<K>, site: Site): Law {
  const law = laws[part.kind];
  if (law === null) throw new Error(`${part.kind} has no law yet`);
  return law(part, site);
}

/** Whether parts of the kind can be solved. */
export function hasLaw(kind: Kind): boolean {
  return laws[kind] !== null;
}
