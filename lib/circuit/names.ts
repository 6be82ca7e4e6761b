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
  if (name === "") return place.fault("badValue", "A name must not be empty; give one.");
  if (!/[/.]/.test(name) && !CONTROL.test(name)) return name;
  const shown = quoted(name.replace(/\p{Cc}/gu, "␣"));
  const message = `The name ${shown} has "/", "." or a control character; leave it out.`;
  return place.fault("badValue", message);
}

/** A title of one line: not empty, without control characters. */
export function readHeading(place: Place): string | null {
  const text = place.text();
  return text !== null && checkHeading(place, text) ? text : null;
}

/** Whether a text, here or as the key of this place, is one line and not empty. */
export function checkHeading(place: Place, text: string): boolean {
  if (text !== "" && !CONTROL.test(text)) return true;
  place.fault("badValue", "A name must be a text of one line, not empty.");
  return false;
}
