// Builds the pages (next build) and the server's and worker's programs (esbuild), if a source changed since the last time.
// Programs: lib/server/main.ts, lib/server/supervisor.ts, lib/jobs/worker.ts and each lib/jobs/*-thread.ts, at the same
// places under .build/, so that import.meta.url finds a neighbour there too (NAME.js instead of NAME.ts).
// With --programs the pages are left out: enough for development, where Next builds them as they are asked for.
import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { build } from "esbuild";
import { inTurn } from "./in-turn.mjs";

const SOURCES = ["app", "lib", "prisma", "next.config.mjs", "tsconfig.json", "package-lock.json"];
const PAGES = ".next/BUILD_ID";
const STAMP = ".build/sources";

/** Every file of the sources but the generated database client, which the schema stands for. */
function sourceFiles() {
  return SOURCES.filter((path) => existsSync(path)).flatMap((path) =>
    statSync(path).isDirectory()
      ? readdirSync(path, { recursive: true, withFileTypes: true })
          .filter((entry) => entry.isFile())
          .map((entry) => join(entry.parentPath, entry.name))
          .filter((file) => !file.startsWith("lib/database/generated/"))
      : [path],
  );
}

function digestOfSources() {
  const hash = createHash("sha256");
  for (const file of sourceFiles().sort()) hash.update(`${file}\n`).update(readFileSync(file));
  return hash.digest("hex");
}

function programs() {
  const threads = existsSync("lib/jobs") ? readdirSync("lib/jobs") : [];
  return [
    "lib/server/main.ts",
    "lib/server/supervisor.ts",
    "lib/server/seed.ts",
    "lib/jobs/worker.ts",
    ...threads.filter((name) => name.endsWith("-thread.ts")).map((name) => `lib/jobs/${name}`),
  ].filter((file) => existsSync(file));
}

async function buildPrograms() {
  await build({
    entryPoints: programs(),
    outdir: ".build",
    outbase: "lib",
    bundle: true,
    packages: "external",
    platform: "node",
    format: "esm",
    target: "node20",
    sourcemap: "linked",
    logLevel: "warning",
  });
}

function run(...command) {
  const { status, stdout, stderr } = spawnSync(process.execPath, command, {
    encoding: "utf8",
    env: { ...process.env, NODE_ENV: "production", NEXT_TELEMETRY_DISABLED: "1" },
  });
  if (status === 0) return;
  process.stderr.write(`${stdout}${stderr}`);
  throw new Error(`${command.join(" ")} failed.`);
}

mkdirSync(".build", { recursive: true });
await inTurn(".build/lock", async () => {
  run(".ci/generate.mjs");
  if (process.argv.includes("--programs")) return buildPrograms();
  const digest = digestOfSources();
  const isFresh = existsSync(PAGES) && existsSync(STAMP) && readFileSync(STAMP, "utf8") === digest;
  if (isFresh) return;
  await buildPrograms();
  run("node_modules/next/dist/bin/next", "build");
  writeFileSync(STAMP, digest);
});
