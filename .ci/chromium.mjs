import { spawnSync } from "node:child_process";
import { existsSync } from "node:fs";

const PLACES = [
  "/usr/bin/chromium",
  "/usr/bin/chromium-browser",
  "/usr/bin/google-chrome",
  "/Applications/Chromium.app/Contents/MacOS/Chromium",
  "/Applications/Google Chrome.app/Contents/MacOS/Google Chrome",
];

/**
 * The browser for the browser tests: the one that AMPERSIGN_CHROMIUM names, one of this machine, or Debian's, which is
 * installed if we may.
 * @returns its path; undefined after saying what to do
 */
export function findChromium() {
  const found = [process.env.AMPERSIGN_CHROMIUM, ...PLACES].find(
    (path) => path && existsSync(path),
  );
  if (found !== undefined) return found;
  if (process.getuid?.() === 0 && existsSync("/usr/bin/apt-get")) {
    process.stdout.write("Installing chromium …\n");
    apt("update");
    apt("install", "-y", "--no-install-recommends", "chromium");
    if (existsSync(PLACES[0])) return PLACES[0];
  }
  process.stderr.write(
    "The browser tests need Chromium: apt-get install chromium, or name one in AMPERSIGN_CHROMIUM.\n",
  );
  return undefined;
}

function apt(...options) {
  const { status, stdout, stderr } = spawnSync("apt-get", ["-q", ...options], {
    encoding: "utf8",
    env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" },
  });
  if (status !== 0) process.stderr.write(`${stdout}${stderr}`);
}
