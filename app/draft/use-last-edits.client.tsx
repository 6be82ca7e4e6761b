"use client";

import { useEffect, useRef, useState } from "react";
import type { CircuitFile } from "../../lib/circuit/circuit-file";
import { fileEdits } from "../../lib/comparison/file-edits";
import { matchParts } from "../../lib/comparison/matching";
import type { PersonView } from "../../lib/review/views";
import type { DesignConnection } from "../collaboration/connect-design.client";
import { editWords } from "../review/edit-words";

export interface LastEdit {
  readonly key: number;
  readonly initials: string;
  readonly words: string;
  /** Hours and minutes, local. */
  readonly at: string;
}

const MOST = 8;

/** The latest edits of the draft while this page has it open, newest first, each with who made it. */
export function useLastEdits(
  connection: DesignConnection,
  file: CircuitFile,
  me: PersonView,
  people: readonly PersonView[],
): readonly LastEdit[] {
  const [edits, setEdits] = useState<readonly LastEdit[]>([]);
  const before = useRef<CircuitFile | null>(null);
  const counter = useRef(0);
  const author = useRef<string | null>(null);
  useEffect(() => {
    const { doc, awareness } = connection;
    const noteAuthor = (transaction: {
      readonly local: boolean;
      readonly afterState: Map<number, number>;
      readonly beforeState: Map<number, number>;
    }): void => {
      if (transaction.local) {
        author.current = me.id;
        return;
      }
      for (const [client, clock] of transaction.afterState) {
        if (clock === (transaction.beforeState.get(client) ?? 0)) continue;
        const shown: unknown = awareness.getStates().get(client)?.["person"];
        author.current =
          typeof shown === "object" &&
          shown !== null &&
          "id" in shown &&
          typeof shown.id === "string"
            ? shown.id
            : null;
      }
    };
    doc.on("afterTransaction", noteAuthor);
    return () => doc.off("afterTransaction", noteAuthor);
  }, [connection, me.id]);
  useEffect(() => {
    const old = before.current;
    before.current = file;
    if (
      old === null ||
      Object.keys(old.blocks).every((name) => old.blocks[name]?.parts.length === 0)
    )
      return;
    const made = fileEdits(old, file, matchParts(old, file)).slice(0, MOST);
    if (made.length === 0) return;
    const person = people.find((one) => one.id === author.current);
    const now = new Date();
    const at = `${String(now.getHours()).padStart(2, "0")}:${String(now.getMinutes()).padStart(2, "0")}`;
    const fresh = made.map(({ edit }): LastEdit => {
      counter.current += 1;
      return {
        key: counter.current,
        initials: person?.initials ?? "?",
        words: editWords(edit),
        at,
      };
    });
    setEdits((held) => [...fresh.toReversed(), ...held].slice(0, MOST));
  }, [file, people]);
  return edits;
}
