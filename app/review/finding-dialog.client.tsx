"use client";

import { useId, useState } from "react";
import type { Severity, Was } from "../../lib/review/review-state";
import { Dialog } from "../dialog/dialog.client";
import { DialogButtons } from "../dialog/reason-dialog.client";

const SEVERITIES: readonly { readonly severity: Severity; readonly means: string }[] = [
  { severity: "major", means: "must be closed before release" },
  { severity: "minor", means: "should be mended, does not hold up release" },
  { severity: "observation", means: "worth knowing" },
  { severity: "question", means: "wants an answer" },
];

/** Writes a finding at the chosen net or part; it remembers the number it is about. */
export function FindingDialog(props: {
  readonly anchor: string;
  readonly was: Was | null;
  readonly wasWords: string | null;
  readonly onRaise: (severity: Severity, text: string) => void;
  readonly onClose: () => void;
}) {
  const [severity, setSeverity] = useState<Severity>("major");
  const [text, setText] = useState("");
  const id = useId();
  return (
    <Dialog title={`New finding at ${props.anchor}`} onClose={props.onClose}>
      <form
        onSubmit={(event) => {
          event.preventDefault();
          if (text.trim() === "") return;
          props.onRaise(severity, text.trim());
          props.onClose();
        }}
      >
        {props.wasWords !== null && (
          <p>
            It will remember <b className="num">{props.wasWords}</b>
            {props.was === null ? "" : `, ${props.was.condition}, Rev ${props.was.revision}`}, and
            say when the number has changed.
          </p>
        )}
        <fieldset>
          <legend>Severity</legend>
          {SEVERITIES.map((one) => (
            <label key={one.severity}>
              <input
                type="radio"
                name="severity"
                value={one.severity}
                checked={severity === one.severity}
                onChange={() => setSeverity(one.severity)}
              />
              <b>{one.severity}</b> {one.means}
            </label>
          ))}
        </fieldset>
        <label htmlFor={id}>What is wrong, and why it matters</label>
        <textarea
          id={id}
          rows={5}
          required
          maxLength={8000}
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
        <DialogButtons
          action="Raise finding"
          busy={false}
          disabled={text.trim() === ""}
          onClose={props.onClose}
        />
      </form>
    </Dialog>
  );
}
