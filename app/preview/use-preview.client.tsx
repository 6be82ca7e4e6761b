"use client";

import { useEffect, useRef, useState } from "react";
import type { CircuitFile } from "../../lib/circuit/circuit-file";
import type { PreviewAnswer } from "./preview-answer";
import { PreviewEngine } from "./preview-engine";

/** The draft as the browser's own engine solves it, and whether that is still the newest edit. */
export interface Preview {
  readonly answer: PreviewAnswer | null;
  readonly stale: boolean;
}

/** Solves the file again after each change of it. `file` must keep its identity while nothing changes. */
export function usePreview(file: CircuitFile | null): Preview {
  const [answered, setAnswered] = useState<{
    readonly file: CircuitFile | null;
    readonly answer: PreviewAnswer;
  } | null>(null);
  const engine = useRef<PreviewEngine | null>(null);
  const asked = useRef<CircuitFile | null>(null);
  useEffect(() => {
    const started = new PreviewEngine((answer) => setAnswered({ file: asked.current, answer }));
    engine.current = started;
    return () => {
      started.close();
      engine.current = null;
    };
  }, []);
  useEffect(() => {
    if (file === null) return;
    asked.current = file;
    engine.current?.ask(file);
  }, [file]);
  return { answer: answered?.answer ?? null, stale: answered?.file !== file };
}
