import { describe, expect, it } from "vitest";
import { nextRevisionLetter } from "../../lib/values/revision-letter";

const letters = (count: number): readonly string[] => {
  const found: string[] = [];
  for (let last: string | null = null; found.length < count; ) {
    last = nextRevisionLetter(last);
    found.push(last);
  }
  return found;
};

// ASME Y14.35, 1997 edition, as quoted on a public page; that AA follows Y is from memory.
describe("revision letters", () => {
  it("skip I, O, Q, S, X and Z, then double", () => {
    expect(letters(23).join(" ")).toBe("A B C D E F G H J K L M N P R T U V W Y AA AB AC");
  });

  it("never repeat", () => {
    const all = letters(1000);
    expect(new Set(all).size).toBe(1000);
    expect(all.at(419)).toBe("YY");
    expect(all.at(420)).toBe("AAA");
  });

  it("throw on what is no revision letter", () => {
    expect(() => nextRevisionLetter("Q")).toThrow("Q");
  });
});
