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
  folder = await mkdtemp(join(tmpdir(), "ampersign-solve-"));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

function solve(...args: readonly string[]): Promise<Answer> {
  return new Promise((resolve) => {
    const options = { maxBuffer: 64 * 1024 * 1024 };
    execFile("npm", ["run", "--silent", "solve", "--", ...args], options, (error, stdout) => {
      resolve({ code: error === null ? 0 : Number(error.code), printed: JSON.parse(stdout) });
    });
  });
}

async function file(name: string, text: string): Promise<string> {
  const path = join(folder, name);
  await writeFile(path, text);
  return path;
}

const divider = (dc: string, more: readonly object[] = []): string =>
  JSON.stringify({
    ampersign: 1,
    blocks: {
      main: {
        parts: [
          {
            ref: "V1",
            kind: "voltageSource",
            pins: { plus: "IN", minus: "GND" },
            params: { dc },
          },
          {
            ref: "R1",
            kind: "resistor",
            pins: { 1: "IN", 2: "OUT" },
            params: { resistance: "3k" },
          },
          {
            ref: "R2",
            kind: "resistor",
            pins: { 1: "OUT", 2: "GND" },
            params: { resistance: "1k" },
          },
          ...more,
        ],
      },
    },
    limits: [{ net: "OUT", max: "1 V" }],
  });

it("prints results and exits 0 where every condition is solved, limits kept or not", async () => {
  const { code, printed } = await solve(await file("divider.json", divider("8 V")));
  expect(code).toBe(0);
  expect(Object.keys(printed)).toEqual([
    "ampersignResult",
    "digest",
    "electricalDigest",
    "engine",
    "reference",
    "unknowns",
    "conditions",
    "stress",
    "limits",
    "problems",
  ]);
  expect(printed).toMatchObject({
    ampersignResult: 1,
    reference: "GND",
    unknowns: 3,
    conditions: [
      {
        name: "Nominal",
        status: "solved",
        nets: { GND: 0, IN: 8, OUT: 2 },
        parts: { V1: { currents: { plus: -0.002, minus: 0.002 }, temperature: 25 } },
        certificate: { iterations: 1, method: "direct" },
        sweep: null,
        frequencyResponse: null,
        transient: null,
        spread: null,
      },
    ],
    limits: [{ net: "OUT", condition: "Nominal", max: 1, low: 2, high: 2, verdict: "fail" }],
    problems: [],
  });
});

it("exits 1 where a condition cannot be solved, and says why", async () => {
  const fighting = {
    ref: "V2",
    kind: "voltageSource",
    pins: { plus: "IN", minus: "GND" },
    params: { dc: 9 },
  };
  const { code, printed } = await solve(await file("fight.json", divider("8 V", [fighting])));
  expect(code).toBe(1);
  expect(printed).toMatchObject({
    conditions: [{ status: "unsolvable", nets: { GND: 0, IN: null } }],
    problems: [{ code: "sourcesFight", condition: "Nominal", parts: ["V1", "V2"] }],
  });
});

it("exits 2 for a bad file, one that is not there, and one that is not text", async () => {
  const bad = await solve(await file("bad.json", divider("8 kg")));
  expect(bad.code).toBe(2);
  expect(bad.printed).toMatchObject({
    ampersignResult: 1,
    problems: [{ at: "/blocks/main/parts/0/params/dc" }],
  });
  const missing = await solve(join(folder, "missing.json"));
  expect(missing).toMatchObject({ code: 2, printed: { problems: [{ code: "unreadable" }] } });
  const path = join(folder, "binary.json");
  await writeFile(path, new Uint8Array([0xff, 0xfe, 0x00, 0xff]));
  expect((await solve(path)).code).toBe(2);
  expect((await solve()).code).toBe(2);
});

it("prints a stress row for each condition where asked", async () => {
  const demo = "tests/kept/ffc-2-A.json";
  const rows = (answer: Answer): number =>
    Array.isArray(answer.printed["stress"]) ? answer.printed["stress"].length : 0;
  const [worst, all] = [await solve(demo), await solve(demo, "--all")];
  expect(worst.code).toBe(0);
  expect(rows(worst)).toBeGreaterThan(0);
  expect(rows(all)).toBe(5 * rows(worst));
});
