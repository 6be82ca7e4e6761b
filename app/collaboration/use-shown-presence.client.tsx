"use client";

import { useCallback, useEffect, useMemo, useSyncExternalStore } from "react";
import type { Awareness } from "y-protocols/awareness";
import type { PersonView } from "../../lib/review/views";
import type { PresentPerson } from "../mast/presence";
import type { Selection } from "../sheet/selection";
import type { Presence } from "../sheet/sheet-props";
import type { DesignConnection } from "./connect-design.client";
import { presenceOf, presentPeople, type ShownPresence } from "./presence";

/** Who has the design open and what they have picked; and how to show one's own choice. */
export interface ShownPeople {
  readonly people: readonly PresentPerson[];
  /** What others have picked, for the sheet. */
  readonly others: readonly Presence[];
  readonly show: (selection: Selection | null) => void;
}

const NOBODY: readonly ShownPresence[] = [];

/** The presence of a design; only oneself until the design is open. */
export function useShownPresence(
  connection: DesignConnection | null,
  me: PersonView,
  people: readonly PersonView[],
): ShownPeople {
  const source = useMemo(
    () => reading(connection?.awareness ?? null, people),
    [connection, people],
  );
  const shown = useSyncExternalStore(source.subscribe, source.current, () => NOBODY);
  const show = useCallback(
    (selection: Selection | null) =>
      connection?.awareness.setLocalStateField("person", presenceOf(me, selection)),
    [connection, me],
  );
  useEffect(() => show(null), [show]);
  return useMemo(
    () => ({
      people: presentPeople(shown, me),
      others: shown.flatMap((one) =>
        one.id === me.id || one.selection === null
          ? []
          : [{ initials: one.initials, name: one.name, selection: one.selection }],
      ),
      show,
    }),
    [shown, me, show],
  );
}

function reading(awareness: Awareness | null, people: readonly PersonView[]) {
  let held = NOBODY;
  const refresh = (): void => {
    held = awareness === null ? NOBODY : shownIn(awareness, people);
  };
  refresh();
  return {
    current: () => held,
    subscribe: (run: () => void) => {
      const changed = (): void => {
        refresh();
        run();
      };
      awareness?.on("change", changed);
      return () => awareness?.off("change", changed);
    },
  };
}

function shownIn(awareness: Awareness, people: readonly PersonView[]): readonly ShownPresence[] {
  return [...awareness.getStates().values()].flatMap((state): readonly ShownPresence[] => {
    const shown: unknown = state["person"];
    if (typeof shown !== "object" || shown === null || !("id" in shown)) return [];
    const person = people.find((one) => one.id === shown.id);
    if (person === undefined) return [];
    const { id, name, initials, roles } = person;
    const selection = "selection" in shown ? selectionOf(shown.selection) : null;
    return [{ id, name, initials, roles, selection }];
  });
}

function selectionOf(value: unknown): Selection | null {
  if (typeof value !== "object" || value === null) return null;
  if ("net" in value && typeof value.net === "string") return { net: value.net };
  if ("part" in value && typeof value.part === "string") return { part: value.part };
  return null;
}
