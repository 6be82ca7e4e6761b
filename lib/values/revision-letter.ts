/** Revision letters of ASME Y14.35: the alphabet without I, O, Q, S, X and Z, read as look-alikes of others. */
const LETTERS = "ABCDEFGHJKLMNPRTUVWY";

/**
 * The revision letter after this one: A for the first (null), then B …, Y, AA, AB …
 * A text that is no revision letter is a defect of the caller.
 */
export function nextRevisionLetter(letter: string | null): string {
  if (letter === null || letter === "") return "A";
  const position = LETTERS.indexOf(letter.slice(-1));
  if (position < 0) throw new Error(`${letter} is not a revision letter`);
  const before = letter.slice(0, -1);
  const next = LETTERS[position + 1];
  return next === undefined
    ? `${nextRevisionLetter(before === "" ? null : before)}A`
    : before + next;
}
