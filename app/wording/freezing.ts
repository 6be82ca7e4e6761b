import type { FileProblem } from "../../lib/values/problem";

type NotFrozen =
  | { readonly kind: "notFound" }
  | { readonly kind: "notADesigner" }
  | { readonly kind: "noChangeNote" }
  | { readonly kind: "draftHasProblems"; readonly problems: readonly FileProblem[] }
  | { readonly kind: "draftNeedsRepair"; readonly sentences: readonly string[] }
  | { readonly kind: "nothingNew"; readonly letter: string };

/** Why a draft was not frozen, and what to do. */
export function freezeRefusal(failure: NotFrozen): string {
  switch (failure.kind) {
    case "notFound":
      return "There is no such design in your workspace.";
    case "notADesigner":
      return "Freezing a revision takes the designer's role in this workspace.";
    case "noChangeNote":
      return "Say in the change note what changed and why.";
    case "draftHasProblems":
      return `The draft cannot be solved yet: ${failure.problems[0]?.message ?? ""}${more(failure.problems.length)}`;
    case "draftNeedsRepair":
      return `The draft needs mending first: ${failure.sentences[0] ?? ""}${more(failure.sentences.length)}`;
    case "nothingNew":
      return `Nothing has changed since Rev ${failure.letter}: there is nothing to freeze.`;
  }
}

function more(count: number): string {
  return count > 1 ? ` And ${count - 1} more.` : "";
}
