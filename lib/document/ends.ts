import { objectOf, textOf } from "./plain";

/** One end of a wire in the document: a part's pin by the part's id, or a junction by its id. */
export type DocumentEnd =
  | { readonly part: string; readonly pin: string }
  | { readonly junction: string };

/** Reads an end; null where it has another shape. */
export function endOf(value: unknown): DocumentEnd | null {
  const end = objectOf(value);
  const junction = textOf(end?.["junction"]);
  if (junction !== null) return { junction };
  const part = textOf(end?.["part"]);
  const pin = textOf(end?.["pin"]);
  return part === null || pin === null ? null : { part, pin };
}

/** A text that is the same for the same end alone. */
export function endKey(end: DocumentEnd): string {
  return "junction" in end ? `j ${end.junction}` : `p ${end.part} ${end.pin}`;
}
