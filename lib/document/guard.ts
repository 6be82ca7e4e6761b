import * as Y from "yjs";
import { fail, ok, type Result } from "../values/result";
import { samePath, storedPath, UpdatePaths } from "./update-paths";
import { removeFault, type Writer, writeFault } from "./write-rules";

/** The person behind a connection, and whether a client id is theirs; null: not known yet. */
export interface GuardedWriter extends Writer {
  readonly owns: (clientId: number) => boolean | null;
}

/** `missing`: what the update builds on is not here; the sender comes back and sends it all. */
export type Refusal =
  | { readonly kind: "malformed" | "missing" | "forbidden" | "tooLarge"; readonly why: string }
  | { readonly kind: "unclaimed"; readonly clientIds: readonly number[] };

const LARGEST_UPDATE = 1 << 20;
const MOST_STRUCTS = 50_000;
const LONGEST_RUN = 1 << 20;
/** Of one update: a page that was often opened without a line brings one for each time. */
const MOST_CLIENT_IDS = 256;

type Decoded = ReturnType<typeof Y.decodeUpdate>;
type Struct = Y.Item | Y.GC;

interface Incoming {
  readonly structs: ReadonlyMap<number, readonly Struct[]>;
  /** The clock after the update's last struct of each client. */
  readonly next: ReadonlyMap<number, number>;
}

/**
 * Judges an update before it is applied, because Yjs cannot take one back: every place it writes or
 * deletes must be the writer's to change. Changes nothing.
 */
export function inspect(
  doc: Y.Doc,
  update: Uint8Array,
  writer: GuardedWriter,
): Result<null, Refusal> {
  if (update.length > LARGEST_UPDATE) return refuse("tooLarge", `${update.length} bytes`);
  let decoded: Decoded;
  try {
    decoded = Y.decodeUpdate(update);
  } catch {
    return refuse("malformed", "no update of a document");
  }
  if (decoded.structs.length > MOST_STRUCTS)
    return refuse("tooLarge", `${decoded.structs.length} structs`);
  const incoming = order(doc, decoded, writer);
  if (!incoming.ok) return incoming;
  const paths = new UpdatePaths(doc, incoming.value.structs);
  for (const [client, structs] of incoming.value.structs)
    for (const struct of structs) {
      if (struct.id.clock + struct.length <= Y.getState(doc.store, client)) continue;
      if (!(struct instanceof Y.Item)) continue;
      const judged = judgeWrite(doc, decoded, writer, paths, struct);
      if (!judged.ok) return judged;
    }
  return judgeDeletes(doc, decoded, writer, incoming.value);
}

function refuse(
  kind: "malformed" | "missing" | "forbidden" | "tooLarge",
  why: string,
): Result<never, Refusal> {
  return fail({ kind, why });
}

function order(doc: Y.Doc, decoded: Decoded, writer: GuardedWriter): Result<Incoming, Refusal> {
  const structs = new Map<number, Struct[]>();
  const next = new Map<number, number>();
  const unclaimed = new Set<number>();
  for (const struct of decoded.structs) {
    if (struct instanceof Y.Skip) return refuse("missing", "a gap");
    const { client } = struct.id;
    const known = next.get(client) ?? Y.getState(doc.store, client);
    const refusal = extentFault(struct, known);
    if (refusal !== null) return fail(refusal);
    if (struct.id.clock + struct.length > known) {
      const owned = writer.owns(client);
      // Under another's id Yjs would swallow the owner's next edits.
      if (owned === false) return refuse("forbidden", "a client id of another person");
      if (owned === null) unclaimed.add(client);
    }
    next.set(client, Math.max(known, struct.id.clock + struct.length));
    const list = structs.get(client);
    if (list === undefined) structs.set(client, [struct]);
    else list.push(struct);
  }
  if (structs.size > MOST_CLIENT_IDS) return refuse("tooLarge", `${structs.size} client ids`);
  if (unclaimed.size > 0) return fail({ kind: "unclaimed", clientIds: [...unclaimed] });
  return ok({ structs, next });
}

/** `known`: the clock up to which the client's structs are here or came before in this update. */
function extentFault(struct: Struct, known: number): Refusal | null {
  const { client, clock } = struct.id;
  const end = clock + struct.length;
  if (!(struct.length > 0 && struct.length <= LONGEST_RUN && end < 2 ** 31))
    return { kind: "malformed", why: "length of a struct" };
  if (!Number.isSafeInteger(client) || client < 0) return { kind: "malformed", why: "client id" };
  if (clock > known) return { kind: "missing", why: "earlier edits" };
  return null;
}

function judgeWrite(
  doc: Y.Doc,
  decoded: Decoded,
  writer: Writer,
  paths: UpdatePaths,
  item: Y.Item,
): Result<null, Refusal> {
  const placed = paths.of(item);
  if (placed.kind === "gone") return ok(null);
  if (placed.kind !== "at") return refuse(placed.kind, placed.why);
  const { path } = placed;
  // Of a run under one key Yjs reads the last value; honest pages send such runs only of overwritten values.
  if (path.keys.at(-1) !== null && item.length !== 1 && !isDeleted(decoded, item))
    return refuse("forbidden", "several values under one key");
  const state = Y.getState(doc.store, item.id.client);
  if (item.id.clock < state) {
    const structs = doc.store.clients.get(item.id.client) ?? [];
    const before = structs[Y.findIndexSS(structs, state - 1)];
    const at = before instanceof Y.Item ? storedPath(before) : null;
    if (at === null || !samePath(at, path)) return refuse("malformed", "continues in two places");
  }
  const fault = writeFault(doc, writer, path, item);
  return fault === null ? ok(null) : refuse("forbidden", fault);
}

function isDeleted(decoded: Decoded, item: Y.Item): boolean {
  if (item.content instanceof Y.ContentDeleted) return true;
  const { client, clock } = item.id;
  const ranges = decoded.ds.clients.get(client) ?? [];
  return ranges.some((one) => one.clock <= clock && one.clock + one.len >= clock + item.length);
}

function judgeDeletes(
  doc: Y.Doc,
  decoded: Decoded,
  writer: Writer,
  { next }: Incoming,
): Result<null, Refusal> {
  for (const [client, ranges] of decoded.ds.clients) {
    const state = Y.getState(doc.store, client);
    for (const { clock, len } of ranges) {
      const end = clock + len;
      if (!(end <= (next.get(client) ?? state))) return refuse("missing", "what it deletes");
      const fault = deleteFault(doc, writer, client, clock, Math.min(end, state));
      if (fault !== null) return refuse("forbidden", fault);
    }
  }
  return ok(null);
}

/** Why the stored structs of a client from `clock` up to `end` may not be deleted; null: they may. */
function deleteFault(
  doc: Y.Doc,
  writer: Writer,
  client: number,
  clock: number,
  end: number,
): string | null {
  if (clock >= end) return null;
  const structs = doc.store.clients.get(client) ?? [];
  for (const item of structs.slice(Y.findIndexSS(structs, clock))) {
    if (item.id.clock >= end) return null;
    if (!(item instanceof Y.Item) || item.deleted) continue;
    const path = storedPath(item);
    const fault = path === null ? null : removeFault(writer, path);
    if (fault !== null) return fault;
  }
  return null;
}
