import { execFile } from "node:child_process";
import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, expect, it } from "vitest";

interface Answer {
  readonly code: number;
  readonly printed: Record<string, unknown>;
}

let folder = "";
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), "ampersign-compare-"));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

function compare(...files: readonly string[]): Promise<Answer> {
  return new Promise((resolve) => {
    const options = { maxBuffer: 64 * 1024 * 1024 };
    execFile("npm", ["run", "--silent", "compare", "--", ...files], options, (error, stdout) => {
      resolve({ code: error === null ? 0 : Number(error.code), printed: JSON.parse(stdout) });
    });
  });
}

async function file(name: string, text: string): Promise<string> {
  const path = join(folder, name);
  await writeFile(path, text);
  return path;
}

const kept = (letter: string): string => `tests/kept/ffc-2-${letter}.json`;

const fight = JSON.stringify({
  ampersign: 1,
  blocks: {
    main: {
      parts: ["V1", "V2"].map((ref, k) => ({
        ref,
        kind: "voltageSource",
        pins: { plus: "IN", minus: "GND" },
        params: { dc: k + 1 },
      })),
    },
  },
});

it("prints one comparison and exits with 0 where both sides are solved", async () => {
  const { code, printed } = await compare(kept("B"), kept("C"));
  expect(code).toBe(0);
  expect(Object.keys(printed)).toEqual([
    "ampersignComparison",
    "base",
    "proposed",
    "edits",
    "nets",
    "stress",
    "causes",
    "problems",
  ]);
  expect(printed["base"]).toMatch(/^sha256:/);
  expect(printed["edits"]).toHaveLength(5);
  expect(printed["problems"]).toEqual([]);
});

it("exits with 1 where a side has no solution, and prints what can be said", async () => {
  const bad = await file("fight.json", fight);
  const { code, printed } = await compare(kept("B"), bad);
  expect(code).toBe(1);
  expect(printed).toMatchObject({ ampersignComparison: 1 });
  expect(printed["problems"]).toMatchObject([{ code: "sourcesFight" }]);
});

it("exits with 2 for a bad file and for one that is not there", async () => {
  const broken = await file("broken.json", "{");
  const bad = await compare(kept("B"), broken);
  expect(bad.code).toBe(2);
  expect(bad.printed["problems"]).toMatchObject([{ code: "notJson" }]);
  const missing = await compare(kept("B"), join(folder, "none.json"));
  expect(missing.code).toBe(2);
  expect(missing.printed["problems"]).toMatchObject([{ code: "unreadable" }]);
  expect((await compare(kept("B"))).code).toBe(2);
});
