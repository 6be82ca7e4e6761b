import * as Y from "yjs";

/** A place in a document: the top-level type, then a key for each step down (null: an entry of a list). */
export interface Path {
  readonly top: string;
  readonly keys: readonly (string | null)[];
}

/** `gone`: Yjs makes garbage of it, so it changes nothing. */
export type Placed =
  | { readonly kind: "at"; readonly path: Path }
  | { readonly kind: "gone" }
  | { readonly kind: "missing" | "malformed"; readonly why: string };

type Struct = Y.Item | Y.GC;
type Hit = { readonly stored: unknown } | { readonly fresh: Struct };

const GONE: Placed = { kind: "gone" };
const DEEPEST_CHAIN = 4096;

/** The place of a struct that the document holds; null: its parent is garbage. */
export function storedPath(item: Y.Item): Path | null {
  const keys: (string | null)[] = [item.parentSub];
  let parent: unknown = item.parent;
  while (parent instanceof Y.AbstractType) {
    const holder: Y.Item | null = parent._item;
    if (holder === null) return { top: Y.findRootTypeKey(parent), keys: keys.reverse() };
    keys.push(holder.parentSub);
    parent = holder.parent;
  }
  return null;
}

export function samePath(a: Path, b: Path): boolean {
  return (
    a.top === b.top &&
    a.keys.length === b.keys.length &&
    a.keys.every((key, index) => key === b.keys[index])
  );
}

/** Finds the places of an update's structs without applying it. */
export class UpdatePaths {
  private readonly known = new Map<Struct, Placed>();

  /** `fresh`: the update's structs of each client, by rising clock. */
  constructor(
    private readonly doc: Y.Doc,
    private readonly fresh: ReadonlyMap<number, readonly Struct[]>,
  ) {}

  of(struct: Struct, depth = 0): Placed {
    const known = this.known.get(struct);
    if (known !== undefined) return known;
    if (depth > DEEPEST_CHAIN) return { kind: "malformed", why: "chain of neighbours" };
    // Whoever asks again while this is being found stands in a circle, at which Yjs would throw halfway.
    this.known.set(struct, { kind: "malformed", why: "circle" });
    const placed = struct instanceof Y.Item ? this.find(struct, depth) : GONE;
    this.known.set(struct, placed);
    return placed;
  }

  private find(item: Y.Item, depth: number): Placed {
    let beside: Path | null = null;
    for (const neighbour of [item.origin, item.rightOrigin]) {
      if (neighbour === null) continue;
      const placed = this.at(neighbour, depth);
      if (placed.kind !== "at") return placed;
      if (beside !== null && !samePath(beside, placed.path))
        return { kind: "malformed", why: "neighbours in two places" };
      beside = placed.path;
    }
    if (beside !== null) return { kind: "at", path: beside };
    const parent: unknown = item.parent;
    if (typeof parent === "string")
      return { kind: "at", path: { top: parent, keys: [item.parentSub] } };
    if (!(parent instanceof Y.ID)) return { kind: "malformed", why: "no parent" };
    return this.below(parent, item.parentSub, depth);
  }

  private below(parent: Y.ID, key: string | null, depth: number): Placed {
    const hit = this.hit(parent);
    if (hit === null) return { kind: "missing", why: "parent" };
    const holder = "stored" in hit ? hit.stored : hit.fresh;
    if (!(holder instanceof Y.Item)) return GONE;
    if (!(holder.content instanceof Y.ContentType))
      return "stored" in hit && holder.deleted
        ? GONE
        : { kind: "malformed", why: "the parent is a plain value" };
    const up = this.at(parent, depth);
    if (up.kind !== "at") return up;
    return { kind: "at", path: { top: up.path.top, keys: [...up.path.keys, key] } };
  }

  private at(id: Y.ID, depth: number): Placed {
    const hit = this.hit(id);
    if (hit === null) return { kind: "missing", why: "neighbour" };
    if ("fresh" in hit) return this.of(hit.fresh, depth + 1);
    const path = hit.stored instanceof Y.Item ? storedPath(hit.stored) : null;
    return path === null ? GONE : { kind: "at", path };
  }

  private hit(id: Y.ID): Hit | null {
    if (id.clock < Y.getState(this.doc.store, id.client)) {
      const structs = this.doc.store.clients.get(id.client) ?? [];
      return { stored: structs[Y.findIndexSS(structs, id.clock)] };
    }
    const list = this.fresh.get(id.client) ?? [];
    let low = 0;
    let high = list.length - 1;
    while (low <= high) {
      const middle = (low + high) >> 1;
      const struct = list[middle];
      if (struct === undefined) return null;
      if (id.clock < struct.id.clock) high = middle - 1;
      else if (id.clock >= struct.id.clock + struct.length) low = middle + 1;
      else return { fresh: struct };
    }
    return null;
  }
}
