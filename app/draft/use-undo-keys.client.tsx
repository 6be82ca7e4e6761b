"use client";

import { useEffect, useState } from "react";
import type * as Y from "yjs";

/** Undo and redo of the own edits, by button and by the keys that every program has (Ctrl or Cmd with Z, and with Shift). */
export function useUndoKeys(undo: Y.UndoManager, mayEdit: boolean) {
  const [, changed] = useState(0);
  useEffect(() => {
    const refresh = (): void => changed((count) => count + 1);
    const key = (event: KeyboardEvent): void => {
      if (!mayEdit || !(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== "z") return;
      const field = event.target;
      if (field instanceof HTMLInputElement || field instanceof HTMLTextAreaElement) return;
      event.preventDefault();
      if (event.shiftKey) undo.redo();
      else undo.undo();
    };
    undo.on("stack-item-added", refresh);
    undo.on("stack-item-popped", refresh);
    window.addEventListener("keydown", key);
    return () => {
      undo.off("stack-item-added", refresh);
      undo.off("stack-item-popped", refresh);
      window.removeEventListener("keydown", key);
    };
  }, [undo, mayEdit]);
  return {
    mayUndo: mayEdit && undo.undoStack.length > 0,
    mayRedo: mayEdit && undo.redoStack.length > 0,
    undo: () => undo.undo(),
    redo: () => undo.redo(),
  };
}
