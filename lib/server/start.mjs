// The one command: from a fresh clone to a running workspace. Plain Node, since nothing is installed yet.
//   npm start        built pages; what is missing or changed is installed and built first
//   npm run dev      pages are built as they are asked for, and again when their source changes
// Settings: PORT (3000), DATABASE_URL (instead of the Postgres it brings), AMPERSIGN_DATA (.data), AMPERSIGN_URL.
import { spawnSync } from "node:child_process";
import { createServer } from "node:net";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import { isInstalled } from "./installed.mjs";

const ROOT = join(import.meta.dirname, "../..");
const OLDEST_NODE = [20, 11];

/** Ends with one sentence for the person at the terminal. */
function giveUp(sentence) {
  process.stderr.write(`${sentence}\n`);
  process.exit(1);
}

function run(what, command, options) {
  process.stdout.write(`${what} …\n`);
  const { status, signal } = spawnSync(command, options, { cwd: ROOT, stdio: "inherit" });
  if (signal !== null) process.exit(1);
  if (status !== 0) giveUp(`${what} failed; the reason stands above.`);
}

function isPortFree(port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once("error", (error) => resolve(error.code !== "EADDRINUSE"));
    probe.listen(port, process.env.AMPERSIGN_HOST ?? "127.0.0.1", () =>
      probe.close(() => resolve(true)),
    );
  });
}

const [major = 0, minor = 0] = process.versions.node.split(".").map(Number);
if (major < OLDEST_NODE[0] || (major === OLDEST_NODE[0] && minor < OLDEST_NODE[1])) {
  giveUp(
    `Ampersign needs Node ${OLDEST_NODE.join(".")} or newer; this is ${process.versions.node}.`,
  );
}
const port = Number(process.env.PORT || 3000);
if (!Number.isInteger(port) || port < 0 || port > 65_535) {
  giveUp(`PORT must be a whole number from 0 to 65535, not ${process.env.PORT}.`);
}
if (!(await isPortFree(port))) {
  giveUp(
    `Port ${port} is taken by another program. Choose another one: PORT=${port + 1} npm start`,
  );
}

const development = process.argv.includes("--dev");
process.chdir(ROOT);
process.env.NEXT_TELEMETRY_DISABLED = "1";
if (!isInstalled(ROOT)) run("Installing", "npm", ["ci", "--loglevel=error"]);
run(
  "Building what changed",
  process.execPath,
  development ? [".ci/build.mjs", "--programs"] : [".ci/build.mjs"],
);
const { supervise } = await import(pathToFileURL(join(ROOT, ".build/server/supervisor.js")).href);
process.exitCode = await supervise({ development, port });
