import * as decoding from "lib0/decoding";
import * as encoding from "lib0/encoding";

/** A message of a page, as y-websocket frames it. */
export type PageMessage =
  | { readonly kind: "stateRequest"; readonly stateVector: Uint8Array }
  | { readonly kind: "update"; readonly update: Uint8Array }
  | { readonly kind: "presence"; readonly entries: readonly PresenceEntry[] };

export interface PresenceEntry {
  readonly clientId: number;
  readonly clock: number;
  /** JSON; `null` says that the page is gone. */
  readonly state: string;
}

const SYNC = 0;
const PRESENCE = 1;
/** Type of the message that tells a page how many of its document frames are stored. */
export const SAVED = 100;

/** Reads a message; null where it is none. */
export function readMessage(bytes: Uint8Array): PageMessage | null {
  try {
    const decoder = decoding.createDecoder(bytes);
    const type = decoding.readVarUint(decoder);
    if (type === PRESENCE) return { kind: "presence", entries: readPresence(decoder) };
    if (type !== SYNC) return null;
    const step = decoding.readVarUint(decoder);
    const payload = decoding.readVarUint8Array(decoder);
    if (step === 0) return { kind: "stateRequest", stateVector: payload };
    return step === 1 || step === 2 ? { kind: "update", update: payload } : null;
  } catch {
    return null;
  }
}

function readPresence(decoder: decoding.Decoder): readonly PresenceEntry[] {
  const inner = decoding.createDecoder(decoding.readVarUint8Array(decoder));
  const count = decoding.readVarUint(inner);
  const entries: PresenceEntry[] = [];
  for (let index = 0; index < count; index++) {
    const clientId = decoding.readVarUint(inner);
    const clock = decoding.readVarUint(inner);
    const state = decoding.readVarString(inner);
    JSON.parse(state);
    entries.push({ clientId, clock, state });
  }
  return entries;
}

/** Step 1 asks for what the receiver has and the sender has not, step 2 answers, an update is news. */
export function syncMessage(step: 0 | 1 | 2, payload: Uint8Array): Uint8Array {
  return encoding.encode((encoder) => {
    encoding.writeVarUint(encoder, SYNC);
    encoding.writeVarUint(encoder, step);
    encoding.writeVarUint8Array(encoder, payload);
  });
}

/** `frames` of the connection's document frames are stored, the last in row `seq`. */
export function savedMessage(frames: number, seq: number): Uint8Array {
  return encoding.encode((encoder) => {
    encoding.writeVarUint(encoder, SAVED);
    encoding.writeVarUint(encoder, frames);
    encoding.writeVarUint(encoder, seq);
  });
}

export function presenceMessage(entries: readonly PresenceEntry[]): Uint8Array {
  const inner = encoding.encode((encoder) => {
    encoding.writeVarUint(encoder, entries.length);
    for (const { clientId, clock, state } of entries) {
      encoding.writeVarUint(encoder, clientId);
      encoding.writeVarUint(encoder, clock);
      encoding.writeVarString(encoder, state);
    }
  });
  return encoding.encode((encoder) => {
    encoding.writeVarUint(encoder, PRESENCE);
    encoding.writeVarUint8Array(encoder, inner);
  });
}
