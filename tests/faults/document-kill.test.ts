import { afterAll, beforeAll, expect, it } from "vitest";
import * as Y from "yjs";
import { connect, type PrismaClient } from "../../lib/database/client";
import { topLevel } from "../../lib/document/shape";
import { type FreshDatabase, freshDatabase } from "../fresh-database";
import { type DocumentProcess, startDocumentProcess } from "./document-process";
import { PageLine } from "./page-line";

const PEOPLE = ["ann", "bob", "cem", "dee"] as const;
const ROUNDS = 3;
/** Edits of one person in a round: below the burst that a connection may send. */
const MOST_EDITS = 200;
const BEFORE_KILL = 120;

interface Edit {
  readonly id: string;
  readonly gone: boolean;
}

interface Page {
  readonly user: string;
  readonly doc: Y.Doc;
  readonly edits: Edit[];
  /** How many of the edits were shown as saved. */
  saved: number;
}

let database: FreshDatabase;
let client: PrismaClient;
let design: string;
let server: DocumentProcess | null = null;

beforeAll(async () => {
  database = await freshDatabase();
  client = connect(database.url);
  const { id: workspaceId } = await client.workspace.create({ data: { name: "Bench" } });
  const made = await client.design.create({ data: { workspaceId, number: "K-1", title: "K" } });
  design = made.id;
});

afterAll(async () => {
  await server?.kill();
  await client.$disconnect();
  await database.drop();
});

/** Draws, and takes away every fifth time: what is deleted leaves no trace in a state vector. */
function editOnce(page: Page, line: PageLine, round: number): void {
  const number = page.edits.length;
  const earlier = page.edits[number - 3];
  const gone = number % 5 === 4 && earlier !== undefined;
  const id = gone ? earlier.id : `${page.user}-${round}-${number}`;
  page.edits.push({ id, gone });
  if (gone) topLevel(page.doc, "parts").delete(id);
  else line.draw(id);
}

/** Lets all edit at once until enough is saved and more is on the way; kills the server in the middle. */
async function burst(
  pages: readonly Page[],
  running: DocumentProcess,
  round: number,
): Promise<void> {
  const lines = pages.map((page) => ({
    page,
    line: new PageLine(`${running.url}/${design}`, `${page.user} designer`, page.doc),
    /** Number of the person's edits that each document frame completes. */
    upTo: [] as number[],
  }));
  await Promise.all(lines.map(({ line }) => line.allSaved()));
  for (const { page } of lines) page.saved = page.edits.length;
  const starts = pages.map((page) => page.edits.length);
  let killing: Promise<void> | null = null;
  for (const one of lines) {
    one.upTo = Array.from({ length: one.line.sent }, () => one.page.edits.length);
    const more = (): boolean => {
      const { page, line, upTo } = one;
      page.saved = Math.max(page.saved, upTo[line.saved - 1] ?? 0);
      if (killing !== null) return true;
      const start = starts[lines.indexOf(one)] ?? 0;
      // Never more than a few dozen on the way, and always some.
      while (page.edits.length - page.saved < 30 && page.edits.length - start < MOST_EDITS) {
        editOnce(page, line, round);
        upTo.push(page.edits.length);
      }
      const done = pages.reduce((sum, { saved }, at) => sum + saved - (starts[at] ?? 0), 0);
      if (done >= BEFORE_KILL) killing = running.kill();
      return killing !== null;
    };
    void one.line.until(more);
  }
  await Promise.all(lines.map(({ line }) => line.closed));
  await killing;
}

const isThere = (doc: Y.Doc, edit: Edit) => topLevel(doc, "parts").has(edit.id) !== edit.gone;

/** The last edit of each id: what it has come to. */
function lastOf(edits: readonly Edit[]): readonly Edit[] {
  return [...new Map(edits.map((edit) => [edit.id, edit])).values()];
}

it("[killed in the middle] what was shown as saved is there, and what another saw; the rest comes back with its page", async () => {
  const pages: readonly Page[] = PEOPLE.map((user) => ({
    user,
    doc: new Y.Doc(),
    edits: [],
    saved: 0,
  }));
  const counted = {
    saved: 0,
    seen: 0,
    onTheWay: 0,
    lost: 0,
    unseen: 0,
    unexpected: 0,
    recovered: 0,
  };
  for (let round = 0; round < ROUNDS; round++) {
    server = await startDocumentProcess(database.url);
    await burst(pages, server, round);

    server = await startDocumentProcess(database.url);
    const reader = new PageLine(`${server.url}/${design}`, "rob reviewer");
    await reader.ready();
    for (const page of pages) {
      const tried = new Set(page.edits.slice(page.saved).map(({ id }) => id));
      // An edit that a later one on the way undoes may be either.
      const saved = lastOf(page.edits.slice(0, page.saved)).filter(({ id }) => !tried.has(id));
      counted.saved += saved.length;
      counted.lost += saved.filter((edit) => !isThere(reader.doc, edit)).length;
      const others = pages.filter((other) => other !== page);
      const seen = page.edits
        .slice(page.saved)
        .filter((edit) => !edit.gone && others.some((other) => isThere(other.doc, edit)));
      counted.seen += seen.length;
      counted.unseen += seen.filter(
        (edit) =>
          !isThere(reader.doc, edit) && !page.edits.some((one) => one.gone && one.id === edit.id),
      ).length;
      counted.onTheWay += page.edits.length - page.saved;
    }
    const drawn = new Set(pages.flatMap(({ edits }) => edits.map(({ id }) => id)));
    for (const id of topLevel(reader.doc, "parts").keys())
      if (!drawn.has(id)) counted.unexpected += 1;

    const { url } = server;
    const back = pages.map(
      ({ user, doc }) => new PageLine(`${url}/${design}`, `${user} designer`, doc),
    );
    await Promise.all(back.map((line) => line.allSaved()));
    const all = pages.flatMap(({ edits }) => lastOf(edits));
    await reader.until((line) => all.every((edit) => isThere(line.doc, edit)));
    counted.recovered += pages.reduce((sum, { edits, saved }) => sum + edits.length - saved, 0);
    await Promise.all([...back, reader].map((line) => line.close()));
    await server.kill();
  }
  expect(counted).toMatchObject({ lost: 0, unseen: 0, unexpected: 0, recovered: counted.onTheWay });
  // It was a burst that was cut off, not the quiet after one.
  expect(counted.saved).toBeGreaterThanOrEqual(ROUNDS * BEFORE_KILL * 0.5);
  expect(counted.onTheWay).toBeGreaterThan(ROUNDS);
}, 120_000);
