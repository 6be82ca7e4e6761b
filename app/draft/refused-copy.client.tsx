"use client";

import * as Y from "yjs";
import { project } from "../../lib/document/projection";

/** Hands out what the page held when the server refused an edit: nothing that somebody drew is lost. */
export function RefusedCopy(props: { readonly copy: Uint8Array; readonly number: string }) {
  const save = () => {
    const doc = new Y.Doc();
    Y.applyUpdate(doc, props.copy);
    const text = `${JSON.stringify(project(doc).file, null, 2)}\n`;
    doc.destroy();
    const url = URL.createObjectURL(new Blob([text], { type: "application/json" }));
    const link = document.createElement("a");
    link.href = url;
    link.download = `${props.number}-refused.json`;
    link.click();
    URL.revokeObjectURL(url);
  };
  return (
    <button type="button" className="btn" onClick={save}>
      Keep a copy as a file
    </button>
  );
}
