import type { Edit } from "../../lib/comparison/comparison";

/** An edit in the fewest words: `R7 30k to 33k`, `C3 removed`, `K1 inductance 0.6 H to 0.4 H`. */
export function editWords(edit: Edit): string {
  const subject = edit.part ?? edit.net ?? edit.condition ?? edit.limit ?? edit.policy ?? "circuit";
  switch (edit.change) {
    case "added":
      return `${subject} added`;
    case "removed":
      return `${subject} removed`;
    case "renamed":
      return `${written(edit.was)} renamed ${written(edit.is)}`;
    case "renumbered":
      return `${written(edit.was)} renumbered ${written(edit.is)}`;
    case "moved":
      return `${subject} moved on the sheet`;
    case "connection":
      return `${subject} pin ${(edit.key ?? "").replace("pins.", "")}: ${written(edit.was)} to ${written(edit.is)}`;
    case "rating":
      return `${subject} rated ${(edit.key ?? "").replace("ratings.", "")} ${written(edit.was)} to ${written(edit.is)}`;
    case "value":
      return `${subject} ${keyWords(edit.key)}${written(edit.was)} to ${written(edit.is)}`;
  }
}

/** The main parameter of a part goes without its name. */
function keyWords(key: string | undefined): string {
  const main = ["resistance", "capacitance", "dc", "breakdownVoltage"];
  return key === undefined || main.includes(key) ? "" : `${key} `;
}

function written(value: unknown): string {
  if (value === undefined || value === null) return "none";
  return typeof value === "string" ? value : JSON.stringify(value);
}
