import { catalogue } from "../../lib/kinds/catalogue";
import type { DrawnNet, DrawnPart } from "../../lib/sheet/sheet-drawing";

/** Kinds whose name, taken apart, is not what people say. */
const SAID: Readonly<Record<string, string>> = {
  bjt: "transistor",
  led: "LED",
  vcvs: "voltage source controlled by a voltage",
  vccs: "current source controlled by a voltage",
  ccvs: "voltage source controlled by a current",
  cccs: "current source controlled by a current",
  mosfet: "MOSFET",
  jfet: "JFET",
};

/** A kind in words: `relay coil`. */
function kindWords(kind: string): string {
  if (!Object.hasOwn(catalogue, kind) && kind !== "block") return "part of unknown kind";
  return SAID[kind] ?? kind.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
}

/** A part as it is read aloud: `R5, resistor, 33k, zone D1, checked`. */
export function partWords({ ref, kind, value, zone, removed, checked }: DrawnPart): string {
  const facts = [ref, kindWords(kind), value, `zone ${zone}`];
  if (removed) facts.push("removed");
  if (checked) facts.push("checked");
  return facts.filter((fact) => fact !== "").join(", ");
}

/** A net as it is read aloud: `Net TREF, 6.021 V, was 5.734, shift +0.287, past a limit, zone E2`. */
export function netWords({ net, zone, reading }: DrawnNet): string {
  const facts = [`Net ${net}`];
  if (reading !== null) {
    facts.push(reading.is);
    if (reading.was !== undefined) facts.push(`was ${reading.was}`);
    if (reading.shift !== undefined) facts.push(`shift ${reading.shift}`);
    if (reading.level === "past") facts.push("past a limit");
  }
  return [...facts, `zone ${zone}`].join(", ");
}
