import { quoted } from "../values/read-value";
import type { Place } from "./place";

const CONTROL = /\p{Cc}/u;

/**
 * The name of a net or a reference designator: not empty, without `/` and `.` (they separate
 * addresses) and without control characters.
 */
export function readName(place: Place): string | null {
  const name = place.text();
  if (name === null) return null;
  return checkName(place, name) ? name : null;
}

/** Whether a text may serve as a name; reports at the place where it may not. */
export function checkName(place: Place, name: string): boolean {
  if (name === "") {
    place.fault("badValue", "A name must not be empty; give one.");
    return false;
  }
  if (/[/.]/.test(name) || CONTROL.test(name)) {
    const shown = quoted(name.replace(/\p{Cc}/gu, "\u2423"));
    place.fault("badValue", `The name ${shown} has "/", "." or a control character; leave it out.`);
    return false;
  }
  return true;
}

/** A title-like text of one line: not empty, without control characters. */
export function readHeading(place: Place): string | null {
  const text = place.text();
  if (text === null) return null;
  if (text !== "" && !CONTROL.test(text)) return text;
  return place.fault("badValue", "This must be a text of one line, not empty.");
}
