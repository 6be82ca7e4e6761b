import { readFile } from "node:fs/promises";
import type * as Y from "yjs";
import { database, databaseUrl } from "../database/client";
import { PostgresDocumentStore } from "../database/document-store";
import { SolverRuns } from "../database/solver-runs";
import { entriesOf, topLevel } from "../document/shape";
import { RunComputer } from "../jobs/run-one";
import { changedItems } from "../review/changed-items";
import type { WaiverSubject } from "../review/review-state";
import type { Result } from "../values/result";
import { createDesign } from "./commands/create-design";
import { freezeRevision } from "./commands/freeze-revision";
import { type About, checkItem, grantWaiver, waivableMargin } from "./commands/review-decisions";
import { signRevision } from "./commands/sign-revision";
import { storedDocument } from "./document-state";
import { reviewOf } from "./review-of";
import type { SeedPerson } from "./seed-members";

/** The people of the story and the computer that does the worker's part before there is one. */
export interface Story {
  readonly people: ReadonlyMap<string, SeedPerson>;
  readonly computer: RunComputer;
}

export function openStory(people: ReadonlyMap<string, SeedPerson>): Story {
  return { people, computer: new RunComputer(new SolverRuns(database())) };
}

function person(story: Story, name: string): SeedPerson {
  const found = story.people.get(name);
  if (found === undefined) throw new Error(`${name} is not in the demo`);
  return found;
}

/** The value of a step that must not fail: the demo is a story that is known to go well. */
function told<Value, Failure>(result: Result<Value, Failure>): Value {
  if (result.ok) return result.value;
  throw new Error(`The demo went wrong: ${JSON.stringify(result.error)}`);
}

/** Makes a design of a file of `prisma/demo`. */
export async function draw(
  story: Story,
  designer: string,
  given: { readonly number: string; readonly file: string; readonly at: string },
): Promise<string> {
  const file = await readFile(`prisma/demo/${given.file}`, "utf8");
  return told(
    await createDesign(person(story, designer).member, {
      number: given.number,
      title: "",
      file,
      at: given.at,
    }),
  );
}

/** Freezes the draft, and solves and compares the revision as the worker would. */
export async function freeze(
  story: Story,
  designer: string,
  number: string,
  changeNote: string,
  at: string,
): Promise<string> {
  const { member } = person(story, designer);
  const letter = told(await freezeRevision(member, { number, changeNote, at }));
  const { revision } = told(await reviewOf(member, number, letter));
  for (const address of [revision.runAddress, revision.comparisonAddress]) {
    const end = await story.computer.run(address);
    // Another revision of the same circuit may have had it computed.
    if (end !== "done" && end !== "notOurs") throw new Error(`The demo's run ended: ${end}`);
  }
  return letter;
}

/** Edits the stored draft under a designer's name, as the document's server would store it. */
export async function edit(
  story: Story,
  designer: string,
  design: string,
  change: (doc: Y.Doc, partNamed: (designator: string) => string) => void,
): Promise<void> {
  const { member } = person(story, designer);
  const doc = await storedDocument(design);
  if (doc === null) throw new Error("The demo's design is gone");
  const store = new PostgresDocumentStore(database(), databaseUrl());
  await store.claimClientId(design, doc.clientID, member.user);
  const updates: Uint8Array[] = [];
  doc.on("update", (bytes: Uint8Array) => updates.push(bytes));
  change(doc, (designator) => {
    const found = entriesOf(topLevel(doc, "parts")).find(
      ([, part]) => part.get("designator") === designator,
    );
    if (found === undefined) throw new Error(`The demo has no part ${designator}`);
    return found[0];
  });
  await store.append(
    design,
    updates.map((bytes) => ({ bytes, author: member.user })),
  );
  doc.destroy();
}

/** Checks off the changed items of a revision: all, or the first few. */
export async function checkOff(
  story: Story,
  reviewer: string,
  number: string,
  letter: string,
  at: string,
  most = Number.POSITIVE_INFINITY,
): Promise<void> {
  const { member } = person(story, reviewer);
  const { comparison } = told(await reviewOf(member, number, letter));
  const items = comparison === null ? [] : changedItems(comparison).slice(0, most);
  for (const item of items) told(await checkItem(member, { number, letter, at }, item.id, true));
}

/** Waives a number as it is shown. */
export async function waive(
  story: Story,
  approver: string,
  about: About,
  subject: WaiverSubject,
  reason: string,
): Promise<void> {
  const { member } = person(story, approver);
  const shown = waivableMargin(told(await reviewOf(member, about.number, about.letter)), subject);
  told(await grantWaiver(member, about, subject, shown ?? null, reason));
}

/** Signs with the own password, one after another. */
export async function signAll(
  story: Story,
  number: string,
  letter: string,
  signatures: readonly (readonly [
    name: string,
    meaning: "authored" | "reviewed" | "approved",
    at: string,
  ])[],
): Promise<void> {
  for (const [name, meaning, at] of signatures) {
    const { member, prove } = person(story, name);
    const { bound } = told(await reviewOf(member, number, letter));
    told(await signRevision(member, { number, letter, at }, meaning, await prove(), { ...bound }));
  }
}
