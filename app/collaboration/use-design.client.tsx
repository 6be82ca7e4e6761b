"use client";

import { useCallback, useEffect, useRef, useState, useSyncExternalStore } from "react";
import type * as Y from "yjs";
import { project } from "../../lib/document/projection";
import type { SaveState } from "../wording/save-words";
import { connectDesign, type DesignConnection, type Refused } from "./connect-design.client";

/**
 * Opens a design while the component stands; null until it runs in a browser. After a refusal it is opened anew, from what
 * is stored; `refused()` of the new connection has the copy.
 */
export function useDesign(designId: string, userId: string): DesignConnection | null {
  const [connection, setConnection] = useState<DesignConnection | null>(null);
  useEffect(() => {
    const url = `${location.origin.replace(/^http/, "ws")}/doc`;
    let opened: DesignConnection;
    const open = (after: Refused | null): void => {
      opened = connectDesign({ designId, userId, url, ...(after !== null && { after }) });
      opened.onStatus(() => {
        const refused = opened.refused();
        if (refused === after || refused?.reopen !== true) return;
        opened.close();
        open(refused);
      });
      setConnection(opened);
    };
    open(null);
    return () => opened.close();
  }, [designId, userId]);
  return connection;
}

/** Whether this page's own edits are stored. */
export function useSaveState(connection: DesignConnection): SaveState {
  return useSyncExternalStore(connection.onStatus, connection.status, connection.status);
}

/** The circuit file that the document stands for now, and what had to be repaired. */
export function useProjection(doc: Y.Doc): ReturnType<typeof project> {
  return useReading(doc, project);
}

/** A reading of the document, made again after each change. `read` must be the same function each time. */
function useReading<Value>(doc: Y.Doc, read: (doc: Y.Doc) => Value): Value {
  const held = useRef<{ readonly doc: Y.Doc; readonly value: Value } | null>(null);
  const subscribe = useCallback(
    (run: () => void) => {
      const changed = () => {
        held.current = null;
        run();
      };
      doc.on("update", changed);
      return () => doc.off("update", changed);
    },
    [doc],
  );
  const snapshot = () => {
    if (held.current?.doc !== doc) held.current = { doc, value: read(doc) };
    return held.current.value;
  };
  return useSyncExternalStore(subscribe, snapshot, snapshot);
}
