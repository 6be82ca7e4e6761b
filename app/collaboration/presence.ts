import type { PersonView } from "../../lib/review/views";
import type { PresentPerson } from "../mast/presence";
import type { Selection } from "../sheet/selection";

/** Someone who has the design open, and what they have picked. */
export interface ShownPresence {
  readonly id: string;
  readonly name: string;
  readonly initials: string;
  readonly roles: readonly string[];
  readonly selection: Selection | null;
}

/** What a page tells the others of itself. Names come from the workspace, never from what a page says. */
export function presenceOf(
  me: PersonView,
  selection: Selection | null,
): { readonly id: string; readonly selection: Selection | null } {
  return { id: me.id, selection };
}

/** Each person once, oneself first, though a person may have several pages open. */
export function presentPeople(
  shown: readonly ShownPresence[],
  me: PersonView,
): readonly PresentPerson[] {
  const others = shown.filter((one) => one.id !== me.id);
  const people = new Map([me, ...others].map((one) => [one.id, one]));
  return [...people.values()].map((one) => ({
    id: one.id,
    name: one.name,
    initials: one.initials,
    function: one.roles.join(", "),
  }));
}
