import { bjtSymbol } from "./bjt-symbol";
import { capacitorSymbol } from "./capacitor-symbol";
import { cccsSymbol } from "./cccs-symbol";
import { ccvsSymbol } from "./ccvs-symbol";
import { comparatorSymbol } from "./comparator-symbol";
import { connectorSymbol } from "./connector-symbol";
import { couplingSymbol } from "./coupling-symbol";
import { currentSourceSymbol } from "./current-source-symbol";
import { diodeSymbol, ledSymbol, schottkySymbol, zenerSymbol } from "./diode-symbol";
import { fuseSymbol } from "./fuse-symbol";
import { inductorSymbol } from "./inductor-symbol";
import { jfetSymbol } from "./jfet-symbol";
import { lampSymbol } from "./lamp-symbol";
import { linearRegulatorSymbol } from "./linear-regulator-symbol";
import { mosfetSymbol } from "./mosfet-symbol";
import { opAmpSymbol } from "./op-amp-symbol";
import { optocouplerSymbol } from "./optocoupler-symbol";
import type { Kind } from "./part";
import type { PartSymbol } from "./part-symbol";
import { potentiometerSymbol } from "./potentiometer-symbol";
import { relayCoilSymbol } from "./relay-coil-symbol";
import { resistorSymbol } from "./resistor-symbol";
import { switchSymbol } from "./switch-symbol";
import { testPointSymbol } from "./test-point-symbol";
import { thermistorSymbol } from "./thermistor-symbol";
import { transformerSymbol } from "./transformer-symbol";
import { vccsSymbol } from "./vccs-symbol";
import { vcvsSymbol } from "./vcvs-symbol";
import { voltageReferenceSymbol } from "./voltage-reference-symbol";
import { voltageSourceSymbol } from "./voltage-source-symbol";

/** The symbol of every kind. A kind without a row here does not compile. */
export const symbols: Readonly<Record<Kind, PartSymbol>> = {
  resistor: resistorSymbol,
  capacitor: capacitorSymbol,
  inductor: inductorSymbol,
  coupling: couplingSymbol,
  voltageSource: voltageSourceSymbol,
  currentSource: currentSourceSymbol,
  vcvs: vcvsSymbol,
  vccs: vccsSymbol,
  ccvs: ccvsSymbol,
  cccs: cccsSymbol,
  bjt: bjtSymbol,
  mosfet: mosfetSymbol,
  jfet: jfetSymbol,
  opAmp: opAmpSymbol,
  comparator: comparatorSymbol,
  switch: switchSymbol,
  thermistor: thermistorSymbol,
  potentiometer: potentiometerSymbol,
  fuse: fuseSymbol,
  lamp: lampSymbol,
  relayCoil: relayCoilSymbol,
  linearRegulator: linearRegulatorSymbol,
  voltageReference: voltageReferenceSymbol,
  optocoupler: optocouplerSymbol,
  transformer: transformerSymbol,
  connector: connectorSymbol,
  testPoint: testPointSymbol,
  diode: diodeSymbol,
  zener: zenerSymbol,
  led: ledSymbol,
  schottky: schottkySymbol,
};
