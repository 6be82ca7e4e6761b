"use client";

import { useRouter } from "next/navigation";
import { useId, useState, useTransition } from "react";
import type { NewDesignDeed } from "./new-design-deed";

type Refusal = Extract<NewDesignDeed, { done: false }>;

/** An empty sheet as a circuit file. */
const EMPTY = JSON.stringify({ ampersign: 1, blocks: { main: { parts: [] } } });

/** Number and title of a new design, and the circuit file it begins with, if any. */
export function NewDesignForm(props: {
  readonly create: (given: {
    readonly number: string;
    readonly title: string;
    readonly file: string;
  }) => Promise<NewDesignDeed>;
}) {
  const router = useRouter();
  const [refusal, setRefusal] = useState<Refusal | null>(null);
  const [file, setFile] = useState<File | null>(null);
  const [number, setNumber] = useState("");
  const [title, setTitle] = useState("");
  const [busy, start] = useTransition();
  const id = useId();
  return (
    <form
      className="sliplike"
      onSubmit={(event) => {
        event.preventDefault();
        start(async () => {
          const text = file === null ? EMPTY : await file.text();
          const deed = await props.create({
            number: number.trim(),
            title: title.trim(),
            file: text,
          });
          if (deed.done) router.push(`/designs/${deed.number}`);
          else setRefusal(deed);
        });
      }}
    >
      <label htmlFor={`${id}-number`}>Number, as on the drawing</label>
      <input
        id={`${id}-number`}
        value={number}
        required
        maxLength={16}
        placeholder="PSU-7"
        onChange={(event) => setNumber(event.target.value)}
      />
      <label htmlFor={`${id}-title`}>Title</label>
      <input
        id={`${id}-title`}
        value={title}
        maxLength={60}
        required={file === null}
        onChange={(event) => setTitle(event.target.value)}
      />
      <label htmlFor={`${id}-file`}>Circuit file (JSON); without one the sheet is empty</label>
      <input
        id={`${id}-file`}
        type="file"
        accept="application/json,.json"
        onChange={(event) => setFile(event.target.files?.[0] ?? null)}
      />
      {refusal !== null && (
        <div className="fault" role="alert">
          <p>{refusal.message}</p>
          <ul>
            {refusal.problems.slice(0, 20).map((problem) => (
              <li key={`${problem.at} ${problem.message}`}>
                <span className="num">{problem.at}</span> {problem.message}
              </li>
            ))}
            {refusal.problems.length > 20 && <li>and {refusal.problems.length - 20} more</li>}
          </ul>
        </div>
      )}
      <div className="acts">
        <a className="btn" href="/">
          Go back
        </a>
        <button type="submit" className="btn main" disabled={busy || number.trim() === ""}>
          {busy ? "One moment …" : "Make design"}
        </button>
      </div>
    </form>
  );
}
