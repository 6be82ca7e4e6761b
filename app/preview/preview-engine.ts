import type { PreviewAnswer, PreviewQuestion, PreviewReply } from "./preview-answer";

/** A solve that is still running when a newer edit comes is ended after this long and begun anew. */
const PATIENCE_MS = 300;

/**
 * Drives the preview worker so that the newest edit is what gets answered: a question that waits is
 * replaced by a newer one, and a solve that outlasts the patience is cancelled for it.
 */
export class PreviewEngine {
  private worker: Worker | null = null;
  private running: { readonly number: number; readonly since: number } | null = null;
  private waiting: PreviewQuestion | null = null;
  private number = 0;
  private patience: ReturnType<typeof setTimeout> | null = null;

  constructor(private readonly onAnswer: (answer: PreviewAnswer) => void) {}

  /** Asks for a draft to be solved; an older question that has not been answered never will be. */
  ask(file: unknown): void {
    this.number += 1;
    this.waiting = { number: this.number, file };
    if (this.running === null) this.next();
    else this.cancelWhenSlow(this.running.since);
  }

  close(): void {
    this.end();
    this.waiting = null;
  }

  private next(): void {
    if (this.waiting === null) return;
    const question = this.waiting;
    this.waiting = null;
    this.running = { number: question.number, since: performance.now() };
    this.worker ??= this.start();
    this.worker.postMessage(question);
  }

  private start(): Worker {
    const worker = new Worker(new URL("./preview.worker.ts", import.meta.url), { type: "module" });
    worker.addEventListener("message", (event: MessageEvent<PreviewReply>) => {
      if (event.data.number !== this.running?.number) return;
      this.running = null;
      this.stopPatience();
      if (event.data.number === this.number) this.onAnswer(event.data.answer);
      this.next();
    });
    return worker;
  }

  private cancelWhenSlow(since: number): void {
    if (this.patience !== null) return;
    const left = Math.max(PATIENCE_MS - (performance.now() - since), 0);
    this.patience = setTimeout(() => {
      this.patience = null;
      if (this.running === null || this.waiting === null) return;
      this.end();
      this.next();
    }, left);
  }

  private end(): void {
    this.stopPatience();
    this.worker?.terminate();
    this.worker = null;
    this.running = null;
  }

  private stopPatience(): void {
    if (this.patience !== null) clearTimeout(this.patience);
    this.patience = null;
  }
}
