/** How far the page's own edits have got: stored, on their way, or kept here because the server is away. */
export type SaveState =
  | { readonly kind: "saved" }
  | { readonly kind: "saving" }
  | { readonly kind: "notSaved"; readonly edits: number }
  | { readonly kind: "refused"; readonly reason: string };

/** What the masthead says of it. */
export function saveWords(state: SaveState): string {
  switch (state.kind) {
    case "saved":
      return "Saved";
    case "saving":
      return "Saving";
    case "notSaved":
      return state.edits === 1 ? "Not saved: 1 edit" : `Not saved: ${state.edits} edits`;
    case "refused":
      return `Refused: ${state.reason}`;
  }
}
