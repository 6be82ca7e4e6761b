import type { FileParameter, FilePart } from "../circuit/circuit-file";
import { kinds, parameterOf } from "../kinds/catalogue";
import type { Kind } from "../kinds/part";
import { formatQuantity } from "../values/format-quantity";
import { quantities } from "../values/quantity";

/** What is lettered beside each kind: its main parameter, else the ratings that choose a type. */
const MAIN: Readonly<Record<Kind, readonly string[]>> = {
  resistor: ["resistance"],
  capacitor: ["capacitance"],
  inductor: ["inductance"],
  coupling: ["coefficient"],
  voltageSource: ["dc", "waveform"],
  currentSource: ["dc", "waveform"],
  vcvs: ["gain"],
  vccs: ["transconductance"],
  ccvs: ["transresistance"],
  cccs: ["gain"],
  diode: ["forwardCurrent"],
  zener: ["breakdownVoltage"],
  led: ["forwardCurrent"],
  schottky: ["forwardCurrent"],
  bjt: ["collectorCurrent"],
  mosfet: ["drainCurrent"],
  jfet: ["drainSourceVoltage"],
  opAmp: [],
  comparator: [],
  switch: [],
  thermistor: ["resistance25"],
  potentiometer: ["resistance"],
  fuse: ["current"],
  relayCoil: ["resistance"],
  lamp: ["ratedVoltage", "ratedPower"],
  linearRegulator: ["outputVoltage"],
  voltageReference: ["voltage"],
  optocoupler: ["transferRatio"],
  transformer: ["turnsRatio"],
  connector: [],
  testPoint: [],
};

/** The value lettered beside a part, as the file writes it: `33k`, `470 µF`, `80 V 1.5 A`. */
export function valueText(part: FilePart): string {
  if (part.kind === "block") return part.block ?? "";
  const kind = kinds.find((known) => known === part.kind);
  if (kind === undefined) return part.kind;
  return MAIN[kind]
    .map((name) => written(kind, name, part.params?.[name] ?? part.ratings?.[name]))
    .filter((text) => text !== "")
    .join(" ");
}

function written(kind: Kind, name: string, value: FileParameter | undefined): string {
  if (value === undefined || value === null || typeof value === "boolean") return "";
  if (typeof value === "string") return value;
  if (typeof value === "object") return Object.keys(value)[0] ?? "";
  return formatQuantity(value, unitOf(kind, name));
}

/** The unit of a number written bare: of the parameter, or of a rating by its name. */
function unitOf(kind: Kind, name: string): string {
  const parameter = parameterOf(kind, name);
  if (parameter?.form === "quantity")
    return Object.keys(quantities[parameter.quantity].units)[0] ?? "";
  if (/voltage$/i.test(name)) return "V";
  return /current$/i.test(name) ? "A" : "";
}
