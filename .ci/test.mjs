// Everything that must hold, in one command: npm test. What is missing is installed first. A step that fails does not
// stop the next ones; the last line counts them all. SEED=… npm test repeats a run's random cases.
import { spawnSync } from "node:child_process";
import { existsSync, mkdirSync, readFileSync, rmSync } from "node:fs";
import { join } from "node:path";
import { isInstalled } from "../lib/server/installed.mjs";

const ROOT = new URL("..", import.meta.url).pathname;
process.chdir(ROOT);

const REPORTS = ".build/reports";
const environment = { ...process.env, NEXT_TELEMETRY_DISABLED: "1" };

/** Runs a command and shows what it says. @returns whether it succeeded */
function run(command, options, extra = {}) {
  const { status } = spawnSync(command, options, {
    stdio: "inherit",
    env: { ...environment, ...extra },
  });
  return status === 0;
}

function bin(name, ...options) {
  return (extra) => run(process.execPath, [`node_modules/${name}`, ...options], extra);
}

function npmScript(name) {
  return () => run("npm", ["run", "--silent", name]);
}

/** A step that is one check. */
function check(work) {
  return () => (work() ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 });
}

/** A step that counts for itself; one that fails without a failed test, or ran none, is a failure too. */
function counted(work, report, read) {
  return () => {
    rmSync(report, { force: true });
    const good = work();
    const { passed, failed } = existsSync(report)
      ? read(JSON.parse(readFileSync(report, "utf8")))
      : { passed: 0, failed: 0 };
    const silent = failed === 0 && (!good || passed === 0);
    return { passed, failed: silent ? 1 : failed };
  };
}

const UNIT_REPORT = `${REPORTS}/unit.json`;
const BROWSER_REPORT = `${REPORTS}/browser.json`;

const unitTests = bin(
  "vitest/vitest.mjs",
  "run",
  "--config=.ci/vitest.config.ts",
  "--reporter=default",
  "--reporter=json",
  `--outputFile.json=${UNIT_REPORT}`,
);

async function browserTests() {
  const { findChromium } = await import("./chromium.mjs");
  const chromium = findChromium();
  if (chromium === undefined) return { passed: 0, failed: 1 };
  const work = () =>
    bin(
      "@playwright/test/cli.js",
      "test",
      "--config=.ci/playwright.config.ts",
    )({
      AMPERSIGN_CHROMIUM: chromium,
      // Whole: the reporter reads a relative name from the folder of its configuration.
      PLAYWRIGHT_JSON_OUTPUT_NAME: join(ROOT, BROWSER_REPORT),
      PLAYWRIGHT_SKIP_BROWSER_DOWNLOAD: "1",
    });
  return counted(work, BROWSER_REPORT, ({ stats }) => ({
    passed: stats.expected,
    // A test that needed a second try, or did not run, has not passed.
    failed: stats.unexpected + stats.flaky + stats.skipped,
  }))();
}

const STEPS = [
  ["database client", check(() => run(process.execPath, [".ci/generate.mjs"]))],
  ["style", check(npmScript("style"))],
  ["types", check(npmScript("types"))],
  ["layers", check(npmScript("layers"))],
  ["unused", check(npmScript("unused"))],
  ["build", check(npmScript("build"))],
  [
    "tests",
    counted(unitTests, UNIT_REPORT, (report) => ({
      passed: report.numPassedTests,
      failed: report.numFailedTests + report.numPendingTests + report.numTodoTests,
    })),
  ],
  ["browser tests", browserTests],
];

if (!isInstalled(ROOT) && !run("npm", ["ci", "--loglevel=error"])) {
  process.stderr.write("The packages could not be installed; the reason stands above.\n");
  process.exit(1);
}
mkdirSync(REPORTS, { recursive: true });
const total = { passed: 0, failed: 0 };
const lines = [];
for (const [name, step] of STEPS) {
  process.stdout.write(`\n== ${name}\n`);
  const begun = performance.now();
  const { passed, failed } = await step();
  total.passed += passed;
  total.failed += failed;
  const seconds = ((performance.now() - begun) / 1000).toFixed(1);
  lines.push(
    `${failed === 0 ? "ok    " : "FAILED"} ${name.padEnd(16)} ${passed} passed, ${failed} failed, ${seconds} s`,
  );
}
process.stdout.write(`\n${lines.join("\n")}\n${total.passed} passed, ${total.failed} failed\n`);
process.exitCode = total.failed === 0 ? 0 : 1;
