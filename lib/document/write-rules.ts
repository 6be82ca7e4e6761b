import * as Y from "yjs";
import type { Role } from "../review/review-state";
import { objectOf } from "./plain";
import { mayWrite, TOP_LEVEL, type TopLevel, topLevel } from "./shape";
import type { Path } from "./update-paths";

export interface Writer {
  readonly user: string;
  readonly roles: readonly Role[];
}

const LARGEST_VALUE = 64 << 10;
const DEEPEST = 8;
const LONGEST_KEY = 200;
const FINDING_MEMBERS = new Set([
  "anchor",
  "severity",
  "text",
  "author",
  "at",
  "revision",
  "was",
  "remarks",
]);

/** Why an item may not be written at a place; null: it may. */
export function writeFault(doc: Y.Doc, writer: Writer, path: Path, item: Y.Item): string | null {
  const top = TOP_LEVEL.find((name) => name === path.top);
  if (top === undefined) return "an unknown top-level type";
  if (!mayWrite(top, writer.roles)) return `no right to write ${top}`;
  return (
    keyFault(path) ??
    contentFault(item.content) ??
    (top === "findings" ? findingFault(doc, writer, path.keys, item) : null) ??
    (top === "design" && path.keys[0] === "schema" ? "the server alone sets the schema" : null)
  );
}

/** Why what stands at a place may not be deleted; null: it may. */
export function removeFault(writer: Writer, path: Path): string | null {
  const top: TopLevel | undefined = TOP_LEVEL.find((name) => name === path.top);
  if (top === undefined) return "an unknown top-level type";
  if (top === "findings") return "nothing is deleted from findings";
  if (top === "design" && path.keys[0] === "schema") return "the server alone sets the schema";
  return mayWrite(top, writer.roles) ? null : `no right to write ${top}`;
}

function keyFault({ keys }: Path): string | null {
  if (keys[0] === null) return "a list entry in a top-level map";
  if (keys.length > DEEPEST) return "nested too deep";
  const bad = keys.some(
    (key) => key !== null && (key === "__proto__" || key === "" || key.length > LONGEST_KEY),
  );
  return bad ? "a key that is not allowed" : null;
}

function contentFault(content: Y.Item["content"]): string | null {
  if (content instanceof Y.ContentDeleted) return null;
  if (content instanceof Y.ContentType) {
    const type: unknown = content.type;
    const plainType = type instanceof Y.Map || type instanceof Y.Array;
    return plainType && !(type instanceof Y.XmlHook) ? null : "a type that is not used here";
  }
  if (!(content instanceof Y.ContentAny)) return "content that is not used here";
  const values: readonly unknown[] = content.arr;
  return values.every((value) => sizeOf(value, 0) <= LARGEST_VALUE)
    ? null
    : "a value that is too large or not plain JSON";
}

/** About the bytes of a plain JSON value; infinite where it is none. */
function sizeOf(value: unknown, depth: number): number {
  if (depth > 32) return Number.POSITIVE_INFINITY;
  if (value === null || typeof value === "boolean") return 1;
  if (typeof value === "number") return Number.isFinite(value) ? 8 : Number.POSITIVE_INFINITY;
  if (typeof value === "string") return value.length + 1;
  if (typeof value !== "object") return Number.POSITIVE_INFINITY;
  if (Array.isArray(value))
    return value.reduce((sum: number, one: unknown) => sum + sizeOf(one, depth + 1), 1);
  // A key `__proto__` on the wire becomes the prototype of what Yjs reads.
  if (Object.getPrototypeOf(value) !== Object.prototype) return Number.POSITIVE_INFINITY;
  return Object.entries(value).reduce(
    (sum, [key, one]) => sum + key.length + sizeOf(one, depth + 1),
    1,
  );
}

/** [WW2] A finding comes whole, under the writer's name; afterwards remarks are appended and nothing else. */
function findingFault(doc: Y.Doc, writer: Writer, keys: Path["keys"], item: Y.Item): string | null {
  const [id, member, entry] = keys;
  if (item.content instanceof Y.ContentDeleted) return "nothing is deleted from findings";
  if (typeof id !== "string") return "a finding without an id";
  if (keys.length === 3 && member === "remarks" && entry === null) return remarkFault(writer, item);
  if (topLevel(doc, "findings").has(id)) return "a finding is not changed";
  if (keys.length === 1) return isType(item, Y.Map) ? null : "a finding is a map";
  if (keys.length !== 2 || typeof member !== "string" || !FINDING_MEMBERS.has(member))
    return "no member of a finding";
  if (item.length !== 1) return "several values under one key";
  if (member === "remarks") return isType(item, Y.Array) ? null : "remarks are a list";
  if (!(item.content instanceof Y.ContentAny)) return "a member of a finding is a plain value";
  const value: unknown = item.content.arr[0];
  return member === "author" && value !== writer.user ? "the author is the writer" : null;
}

function remarkFault(writer: Writer, item: Y.Item): string | null {
  if (item.rightOrigin !== null) return "remarks are appended";
  if (!(item.content instanceof Y.ContentAny)) return "a remark is a plain value";
  const values: readonly unknown[] = item.content.arr;
  return values.every((value) => objectOf(value)?.["author"] === writer.user)
    ? null
    : "the author is the writer";
}

function isType(item: Y.Item, type: typeof Y.Map | typeof Y.Array): boolean {
  return item.content instanceof Y.ContentType && item.content.type instanceof type;
}
