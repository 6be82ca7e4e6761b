import { readFile } from "node:fs/promises";
import { expect } from "vitest";
import type * as Y from "yjs";
import { database } from "../../lib/database/client";
import { PostgresDocumentStore } from "../../lib/database/document-store";
import { setParameter } from "../../lib/document/edits";
import { entriesOf, topLevel } from "../../lib/document/shape";
import { changedItems } from "../../lib/review/changed-items";
import type { Role } from "../../lib/review/review-state";
import { addPerson } from "../../lib/server/auth";
import { createDesign } from "../../lib/server/commands/create-design";
import { freezeRevision } from "../../lib/server/commands/freeze-revision";
import { checkItem, grantWaiver, waivableMargin } from "../../lib/server/commands/review-decisions";
import { signRevision } from "../../lib/server/commands/sign-revision";
import { storedDocument } from "../../lib/server/document-state";
import { reviewOf } from "../../lib/server/review-of";
import { type ActingMember, actingMember, provePassword, signIn } from "../../lib/server/sign-in";
import { type FreshDatabase, freshDatabase } from "../fresh-database";
import { type RunningProcess, startWorkerProcess, TEST_SECRET } from "../server-process";

export const PASSWORD = "long enough for a test";
export const MINUTE_MS = 60_000;
export const FAN = "FFC-2";
export const COIL = { part: "K1", rule: "cp-relay-coil", condition: "Cold crank" };

type Meaning = "authored" | "reviewed" | "approved";

/** The value of a step that has to go well. */
export function good<Value>(
  result: { ok: true; value: Value } | { ok: false; error: unknown },
): Value {
  if (!result.ok) throw new Error(JSON.stringify(result.error));
  return result.value;
}

/** Changes a resistance in a document. */
export function setResistance(designator: string, value: string): (doc: Y.Doc) => void {
  return (doc) => {
    const found = entriesOf(topLevel(doc, "parts")).find(
      ([, part]) => part.get("designator") === designator,
    );
    setParameter(doc, found?.[0] ?? "", "resistance", value);
  };
}

/** A workspace with its people, the fan controller's draft, and a real worker; and another workspace's member. */
export class Shop {
  private constructor(
    readonly fresh: FreshDatabase,
    private readonly worker: RunningProcess,
    readonly designer: ActingMember,
    /** Also a designer, but no author until they edit. */
    readonly reviewer: ActingMember,
    readonly approver: ActingMember,
    readonly outsider: ActingMember,
    readonly design: string,
  ) {}

  static async open(): Promise<Shop> {
    const fresh = await freshDatabase();
    process.env["DATABASE_URL"] = fresh.url;
    process.env["AMPERSIGN_SECRET"] = TEST_SECRET;
    const worker = await startWorkerProcess({ databaseUrl: fresh.url });
    const ours = await database().workspace.create({ data: { name: "Ours" } });
    const theirs = await database().workspace.create({ data: { name: "Theirs" } });
    const designer = await person("designer", ours.id, ["designer"]);
    const reviewer = await person("reviewer", ours.id, ["designer", "reviewer"]);
    const approver = await person("approver", ours.id, ["approver"]);
    const outsider = await person("outsider", theirs.id, ["designer", "reviewer", "approver"]);
    const file = await readFile("prisma/demo/ffc-2-A.json", "utf8");
    const design = good(await createDesign(designer, { number: FAN, title: "", file }));
    return new Shop(fresh, worker, designer, reviewer, approver, outsider, design);
  }

  async close(): Promise<void> {
    await this.worker.stop();
    const queue = await globalThis.ampersignQueue;
    await queue?.close();
    await database().$disconnect();
    await this.fresh.drop();
  }

  /** Freezes the draft and waits until the worker has solved and compared it. */
  async freeze(note: string): Promise<string> {
    const letter = good(await freezeRevision(this.designer, { number: FAN, changeNote: note }));
    await expect
      .poll(async () => good(await reviewOf(this.designer, FAN, letter)).comparison, {
        timeout: MINUTE_MS,
        interval: 100,
      })
      .not.toBeNull();
    return letter;
  }

  /** Changes the stored document in a person's name, as the document's server would. */
  async write(by: ActingMember, change: (doc: Y.Doc) => void): Promise<void> {
    const doc = await storedDocument(this.design);
    if (doc === null) throw new Error("The design is there");
    const updates: Uint8Array[] = [];
    doc.on("update", (bytes: Uint8Array) => updates.push(bytes));
    change(doc);
    const store = new PostgresDocumentStore(database(), this.fresh.url);
    await store.append(
      this.design,
      updates.map((bytes) => ({ bytes, author: by.user })),
    );
  }

  async checkAll(by: ActingMember, letter: string): Promise<void> {
    const { comparison } = good(await reviewOf(by, FAN, letter));
    for (const { id } of comparison === null ? [] : changedItems(comparison))
      good(await checkItem(by, { number: FAN, letter }, id, true));
  }

  /** Waives a number as it is shown. */
  async waive(subject: typeof COIL, letter: string, reason: string) {
    const shown = waivableMargin(good(await reviewOf(this.approver, FAN, letter)), subject);
    return grantWaiver(this.approver, { number: FAN, letter }, subject, shown ?? null, reason);
  }

  async sign(by: ActingMember, letter: string, meaning: Meaning) {
    const proof = good(await provePassword(by, PASSWORD));
    const { bound } = good(await reviewOf(by, FAN, letter));
    return signRevision(by, { number: FAN, letter }, meaning, proof, { ...bound });
  }
}

async function person(
  name: string,
  workspaceId: string,
  roles: readonly Role[],
): Promise<ActingMember> {
  const email = `${name}@shop.example`;
  const userId = await addPerson({ name, email, password: PASSWORD });
  await database().member.create({ data: { workspaceId, userId, roles: [...roles] } });
  const opened = good(await signIn({ email, password: PASSWORD, headers: new Headers() }));
  const cookie = opened.map((one) => one.split(";", 1)[0]).join("; ");
  return good(await actingMember(new Headers({ cookie })));
}
