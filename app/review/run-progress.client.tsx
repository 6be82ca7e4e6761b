"use client";

import { useRouter } from "next/navigation";
import { useEffect, useState } from "react";
import type { RunView } from "../../lib/review/views";

const ASK_EVERY_MS = 700;

/** The worker's progress on a revision, asked for until it is done; then the page takes the results in. */
export function RunProgress(props: { readonly run: RunView; readonly what: string }) {
  const router = useRouter();
  const [run, setRun] = useState(props.run);
  const { address } = props.run;
  useEffect(() => {
    const asking = new AbortController();
    const timer = setInterval(() => {
      fetch(`/api/runs/${encodeURIComponent(address)}`, { signal: asking.signal })
        .then((answer) => (answer.ok ? answer.json() : null))
        .then((state: RunView | null) => {
          if (state === null) return;
          setRun(state);
          if (state.state === "done" || state.state === "failed") {
            clearInterval(timer);
            router.refresh();
          }
        })
        // The server is away for the moment: the next question may find it.
        .catch(() => undefined);
    }, ASK_EVERY_MS);
    return () => {
      clearInterval(timer);
      asking.abort();
    };
  }, [address, router]);
  return (
    <section className="progress" aria-live="polite">
      <h2>{progressWords(run, props.what)}</h2>
      {run.of > 0 && run.state === "running" && (
        <progress value={run.done} max={run.of} aria-label={props.what} />
      )}
      {run.failure !== null && <p className="worse">{run.failure}</p>}
    </section>
  );
}

/** `Solving Rev D: condition 2 of 5, Hot and charging`. */
function progressWords(run: RunView, what: string): string {
  switch (run.state) {
    case "queued":
      return `${what}: waits for the worker`;
    case "running":
      return `${what}: ${Math.min(run.done + 1, run.of)} of ${run.of}${run.at === null ? "" : `, ${run.at}`}`;
    case "done":
      return `${what}: done`;
    case "failed":
      return `${what}: failed`;
  }
}
