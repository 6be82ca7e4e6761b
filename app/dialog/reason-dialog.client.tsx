"use client";

import { useId, useState, useTransition } from "react";
import type { Deed } from "./deed";
import { Dialog } from "./dialog.client";

/** Asks for a reason in words, then does the deed; what the server answers is said in place. */
export function ReasonDialog(props: {
  readonly title: string;
  readonly explanation: string;
  readonly label: string;
  readonly action: string;
  readonly onDo: (reason: string) => Promise<Deed>;
  readonly onClose: () => void;
}) {
  const [reason, setReason] = useState("");
  const [message, setMessage] = useState<string | null>(null);
  const [busy, start] = useTransition();
  const id = useId();
  return (
    <Dialog title={props.title} onClose={props.onClose}>
      <form
        onSubmit={(event) => {
          event.preventDefault();
          start(async () => {
            const deed = await props.onDo(reason.trim());
            if (deed.done) props.onClose();
            else setMessage(deed.message);
          });
        }}
      >
        <p>{props.explanation}</p>
        <label htmlFor={id}>{props.label}</label>
        <textarea
          id={id}
          rows={4}
          required
          maxLength={4000}
          value={reason}
          onChange={(event) => setReason(event.target.value)}
        />
        {message !== null && (
          <p className="fault" role="alert">
            {message}
          </p>
        )}
        <DialogButtons
          action={props.action}
          busy={busy}
          disabled={reason.trim() === ""}
          onClose={props.onClose}
        />
      </form>
    </Dialog>
  );
}

/** The closing row of a dialog: back, and the deed. */
export function DialogButtons(props: {
  readonly action: string;
  readonly busy: boolean;
  readonly disabled: boolean;
  readonly onClose: () => void;
}) {
  return (
    <div className="acts">
      <button type="button" className="btn" onClick={props.onClose}>
        Go back
      </button>
      <button type="submit" className="btn main" disabled={props.disabled || props.busy}>
        {props.busy ? "One moment …" : props.action}
      </button>
    </div>
  );
}
