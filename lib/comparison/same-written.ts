import { kinds, parameterOf } from "../kinds/catalogue";
import { readValue } from "../values/read-value";

/** Whether two written members say the same: by the letter, or as values of a parameter (`4k7` and 4700). */
export function sameWritten(
  kind: string,
  group: string,
  key: string,
  was: unknown,
  is: unknown,
): boolean {
  if (JSON.stringify(was) === JSON.stringify(is)) return true;
  const known = kinds.find((one) => one === kind);
  if (group !== "params" || known === undefined) return false;
  const parameter = parameterOf(known, key);
  if (parameter?.form !== "quantity") return false;
  const read = (written: unknown): number | null => {
    if (typeof written === "number") return written;
    if (written === undefined) return parameter.default ?? null;
    if (typeof written !== "string") return null;
    const value = readValue(written, parameter.quantity);
    // A letter code that carries a tolerance says more than its value.
    return value.ok && value.value.tolerance === null ? value.value.value : null;
  };
  const before = read(was);
  return before !== null && before === read(is);
}
