/** Why a design was not made, and what to do. */
export function newDesignRefusal(
  failure:
    | { readonly kind: "notADesigner" }
    | { readonly kind: "numberTaken"; readonly number: string }
    | { readonly kind: "badNumber" }
    | { readonly kind: "badFile"; readonly problems: readonly unknown[] },
): string {
  switch (failure.kind) {
    case "notADesigner":
      return "Making a design takes the designer's role in this workspace.";
    case "numberTaken":
      return `There is a design ${failure.number} already. Choose another number.`;
    case "badNumber":
      return "A number has capitals, figures and hyphens, 16 at most, as FFC-2.";
    case "badFile":
      return `The circuit file has ${failure.problems.length === 1 ? "a problem" : `${failure.problems.length} problems`}; nothing was brought in.`;
  }
}
