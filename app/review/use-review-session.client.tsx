"use client";

import { useCallback, useMemo, useSyncExternalStore } from "react";
import { addRemark, raiseFinding, readDecisions, readFindings } from "../../lib/document/findings";
import type { Decision, Finding } from "../../lib/review/review-state";
import type { ReviewView } from "../../lib/review/views";
import type { DesignConnection } from "../collaboration/connect-design.client";
import { useDesign } from "../collaboration/use-design.client";
import { useShownPresence } from "../collaboration/use-shown-presence.client";
import type { SaveState } from "../wording/save-words";
import type { ReviewSession } from "./session";

const NOT_OPEN: SaveState = { kind: "saving" };

/**
 * The live side of a review page. Until the shared document has come, what the page was made with
 * stands; a released revision stays as it was signed, whatever is said later.
 */
export function useReviewSession(view: ReviewView): ReviewSession {
  const { me, design, people } = view;
  const connection = useDesign(design.id, me.id);
  const fixed = view.proposed.state === "released" || view.proposed.state === "superseded";
  const findings = useLive(connection, readFindings, fixed ? view.findings : null, view.findings);
  const decisions = useLive(
    connection,
    readDecisions,
    fixed ? view.decisions : null,
    view.decisions,
  );
  const save = useSave(connection);
  const presence = useShownPresence(connection, me, people);
  return useMemo(
    (): ReviewSession => ({
      findings,
      decisions,
      save,
      people: presence.people,
      others: presence.others,
      raise: (finding) => {
        if (connection !== null)
          raiseFinding(connection.doc, { ...finding, author: me.id, at: new Date().toISOString() });
      },
      remark: (finding, text) => {
        if (connection !== null)
          addRemark(connection.doc, finding, { author: me.id, at: new Date().toISOString(), text });
      },
      show: presence.show,
    }),
    [findings, decisions, save, presence, me, connection],
  );
}

/** A reading of the live document; `fixed` where it may not change any longer, `before` until it is there. */
function useLive<Value extends readonly (Finding | Decision)[]>(
  connection: DesignConnection | null,
  read: (doc: DesignConnection["doc"]) => Value,
  fixed: Value | null,
  before: Value,
): Value {
  const source = useMemo(() => liveReading(connection, read, before), [connection, read, before]);
  const live = useSyncExternalStore(source.subscribe, source.current, () => before);
  return fixed ?? live;
}

function liveReading<Value extends readonly unknown[]>(
  connection: DesignConnection | null,
  read: (doc: DesignConnection["doc"]) => Value,
  before: Value,
) {
  let held = before;
  const refresh = (): void => {
    if (connection === null) return;
    const fresh = read(connection.doc);
    // An empty document has not come yet: decisions and findings are never taken away.
    if (fresh.length >= before.length) held = fresh;
  };
  refresh();
  return {
    current: () => held,
    subscribe: (run: () => void) => {
      const changed = (): void => {
        refresh();
        run();
      };
      connection?.doc.on("update", changed);
      changed();
      return () => connection?.doc.off("update", changed);
    },
  };
}

function useSave(connection: DesignConnection | null): SaveState {
  return useSyncExternalStore(
    useCallback((run: () => void) => connection?.onStatus(run) ?? (() => undefined), [connection]),
    () => connection?.status() ?? NOT_OPEN,
    () => NOT_OPEN,
  );
}
