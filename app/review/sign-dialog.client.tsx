"use client";

import { useId, useState, useTransition } from "react";
import type { Deed } from "../dialog/deed";
import { Dialog } from "../dialog/dialog.client";
import { DialogButtons } from "../dialog/reason-dialog.client";
import { cautions } from "../wording/cautions";

export type Meaning = "authored" | "reviewed" | "approved";

const MEANINGS: Readonly<Record<Meaning, string>> = {
  authored: "I am an author of this revision and submit it as it stands.",
  reviewed: "I have reviewed this revision and its comparison with the base.",
  approved: "I approve this revision for release. It is released with this signature.",
};

/** Signing: the meaning spelt out, what it binds, the usual cautions, and the password again. */
export function SignDialog(props: {
  readonly revision: string;
  readonly meaning: Meaning;
  readonly digest: string;
  readonly onSign: (password: string) => Promise<Deed>;
  readonly onClose: () => void;
}) {
  const [password, setPassword] = useState("");
  const [message, setMessage] = useState<string | null>(null);
  const [busy, start] = useTransition();
  const id = useId();
  return (
    <Dialog title={`Sign Rev ${props.revision}: ${props.meaning}`} onClose={props.onClose}>
      <form
        onSubmit={(event) => {
          event.preventDefault();
          start(async () => {
            const deed = await props.onSign(password);
            if (deed.done) props.onClose();
            else {
              setPassword("");
              setMessage(deed.message);
            }
          });
        }}
      >
        <p>{MEANINGS[props.meaning]}</p>
        <p className="small">
          The signature is bound to the circuit, its results, the policy, and the findings and
          decisions as they stand now. Circuit: <span className="num digest">{props.digest}</span>
        </p>
        <ul className="caut">
          {cautions.map((caution) => (
            <li key={caution}>{caution}</li>
          ))}
        </ul>
        <label htmlFor={id}>Your password, again</label>
        <input
          id={id}
          type="password"
          autoComplete="current-password"
          required
          value={password}
          onChange={(event) => setPassword(event.target.value)}
        />
        {message !== null && (
          <p className="fault" role="alert">
            {message}
          </p>
        )}
        <DialogButtons
          action="Sign"
          busy={busy}
          disabled={password === ""}
          onClose={props.onClose}
        />
      </form>
    </Dialog>
  );
}
