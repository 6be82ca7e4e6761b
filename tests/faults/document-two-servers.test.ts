import { afterAll, beforeAll, expect, it } from "vitest";
import * as Y from "yjs";
import { topLevel } from "../../lib/document/shape";
import { type DocumentBench, documentBench } from "./document-bench";
import { type DocumentProcess, startDocumentProcess } from "./document-process";
import { PageLine } from "./page-line";

const EDITS = 60;
let bench: DocumentBench;
let servers: readonly DocumentProcess[] = [];

beforeAll(async () => {
  bench = await documentBench();
  servers = await Promise.all([startDocumentProcess(bench.url), startDocumentProcess(bench.url)]);
}, 60_000);

afterAll(async () => {
  for (const server of servers) await server.kill();
  await bench.drop();
});

const contentOf = ({ doc }: PageLine) =>
  JSON.stringify(Object.entries(topLevel(doc, "parts").toJSON()).sort());

async function openedAtEach(design: string): Promise<readonly PageLine[]> {
  const lines = servers.map(
    ({ url }, at) => new PageLine(`${url}/${design}`, `${at === 0 ? "ann" : "bob"} designer`),
  );
  await Promise.all(lines.map((line) => line.ready()));
  return lines;
}

/** All draw at once, all of them the same parts too. */
function burst(lines: readonly PageLine[], name: string): void {
  for (let edit = 0; edit < EDITS; edit++)
    for (const [at, line] of lines.entries()) {
      line.draw(edit % 4 === 0 ? `${name}-${edit}` : `${name}-${at}-${edit}`, `kind ${at}`);
    }
}

/** Parts of a burst: a quarter is drawn by both. */
const PARTS = EDITS / 4 + 2 * (EDITS - EDITS / 4);

it("shows the edits of each process at the other's pages, and both come to the same", async () => {
  const lines = await openedAtEach(await bench.newDesign());
  burst(lines, "one");
  await Promise.all(lines.map((line) => line.allSaved()));
  await Promise.all(
    lines.map((line) => line.until(({ doc }) => topLevel(doc, "parts").size === PARTS)),
  );
  const [ann, bob] = lines;
  if (ann === undefined || bob === undefined) throw new Error("Two pages were opened.");
  await bob.until(() => contentOf(bob) === contentOf(ann));
  await ann.until(() => contentOf(bob) === contentOf(ann));
  expect(Y.encodeStateVector(bob.doc)).toEqual(Y.encodeStateVector(ann.doc));
  await Promise.all(lines.map((line) => line.close()));
});

it("catches up after the lines to the database were cut", async () => {
  const lines = await openedAtEach(await bench.newDesign());
  // The listeners, and whatever connection of the pools is there: what cannot be stored is not claimed.
  await bench.client.$executeRaw`select pg_terminate_backend(pid) from pg_stat_activity
    where datname = current_database() and query like 'listen%'`;
  burst(lines, "two");
  await Promise.all(lines.map((line) => line.allSaved()));
  await Promise.all(
    lines.map((line) => line.until(({ doc }) => topLevel(doc, "parts").size === PARTS)),
  );
  const [ann, bob] = lines.map(contentOf);
  expect(bob).toBe(ann);
  await Promise.all(lines.map((line) => line.close()));
});
