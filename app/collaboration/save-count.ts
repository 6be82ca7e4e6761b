/** What a document frame of a line brings: the answer to the server's question brings all the page has, an update one change. */
export type FrameKind = "answer" | "update";

interface Reached {
  readonly changes: number;
  readonly edits: number;
}

const NOTHING: Reached = { changes: 0, edits: 0 };

/**
 * Counts what this page holds against what the server says is stored. A line's frames are numbered from one, and the
 * server tells how many are stored. Until the answer is sent, a frame says nothing of what was made without a line.
 */
export class SaveCount {
  private made: Reached = NOTHING;
  private stored: Reached = NOTHING;
  private frames: (Reached | null)[] = [];
  private earlier = 0;
  private isAnswered = false;
  private isConfirmed = false;

  /** Edits that are not known to be stored. */
  get unsaved(): number {
    return this.made.edits - this.stored.edits + this.earlier;
  }

  /** Whether the server has said of everything on this page that it is stored. */
  get isSaved(): boolean {
    return this.isConfirmed && this.stored.changes === this.made.changes;
  }

  /** A change came up that the server may not have: `edits` of a person, none where they cannot be told apart. */
  add(edits: number): void {
    this.made = { changes: this.made.changes + 1, edits: this.made.edits + edits };
  }

  /** Edits from before a reload were not known to be stored; their content comes up as a change. */
  addEarlier(edits: number): void {
    if (!this.isSaved) this.earlier = edits;
  }

  /** A new line: what was on its way may be gone. */
  lineOpened(): void {
    this.frames = [];
    this.isAnswered = false;
  }

  /** A document frame is being sent. */
  frameSent(kind: FrameKind): void {
    if (kind === "answer") this.isAnswered = true;
    this.frames.push(this.isAnswered ? this.made : null);
  }

  /** `count` of this line's document frames are stored. */
  framesStored(count: number): void {
    const reached = this.frames[count - 1] ?? null;
    if (reached === null) return;
    this.isConfirmed = true;
    this.stored = reached;
    if (this.isSaved) this.earlier = 0;
  }
}
