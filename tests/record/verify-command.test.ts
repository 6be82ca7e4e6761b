import { execFile } from "node:child_process";
import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, expect, it } from "vitest";
import { z } from "zod";
import { demoRevision } from "../demo-revisions";
import { recordOf, sealedText } from "./records";

const verdict = z.object({
  holds: z.boolean(),
  checks: z.array(z.object({ check: z.string(), holds: z.boolean(), message: z.string() })),
});

const MINUTE_MS = 60_000;
let folder = "";
let sealed = "";

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), "ampersign-verify-"));
  sealed = await sealedText(recordOf(demoRevision("B"), demoRevision("A")));
}, MINUTE_MS);
afterAll(() => rm(folder, { recursive: true, force: true }));

function command(...files: readonly string[]) {
  return new Promise<{ code: number; stdout: string; stderr: string }>((resolve) => {
    execFile("npm", ["run", "--silent", "verify", "--", ...files], (error, stdout, stderr) => {
      resolve({ code: error === null ? 0 : Number(error.code), stdout, stderr });
    });
  });
}

async function verified(name: string, text: string) {
  const path = join(folder, name);
  await writeFile(path, text);
  const { code, stdout } = await command(path);
  const { holds, checks } = verdict.parse(JSON.parse(stdout));
  return { code, holds, broken: checks.filter((one) => !one.holds) };
}

it(
  "exits with 0 for the record of the demo's Rev B against Rev A, every number solved again",
  async () => {
    expect(await verified("held.json", sealed)).toEqual({ code: 0, holds: true, broken: [] });
  },
  MINUTE_MS,
);

it(
  "exits with 1 where something was changed, and names it",
  async () => {
    const at = sealed.indexOf('"resistance":"', sealed.indexOf('"circuit"')) + 14;
    const digit = sealed.charAt(at) === "1" ? "2" : "1";
    const changed = sealed.slice(0, at) + digit + sealed.slice(at + 1);
    const { code, holds, broken } = await verified("changed.json", changed);
    expect({ code, holds }).toEqual({ code: 1, holds: false });
    const names = broken.map(({ check }) => check);
    expect(names).toEqual(expect.arrayContaining(["digest", "signature", "circuits", "results"]));
    expect(broken.find(({ check }) => check === "results")?.message).toMatch(
      /differ, first .+: .+ in the record, .+ now\.$/,
    );
  },
  MINUTE_MS,
);

it(
  "exits with 2 for what is no record, with the reason",
  async () => {
    expect(await verified("circuit.json", JSON.stringify(demoRevision("B").file))).toMatchObject({
      code: 2,
      broken: [{ check: "form" }],
    });
    const missing = await command(join(folder, "none.json"));
    expect(missing).toMatchObject({ code: 2, stdout: "" });
    expect(missing.stderr).toContain("cannot be read");
    expect((await command()).code).toBe(2);
  },
  MINUTE_MS,
);
