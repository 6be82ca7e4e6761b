import { mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { setTimeout as pause } from "node:timers/promises";

const LOOK_AGAIN_MS = 200;

/**
 * Runs the work while no other process runs work under the same lock; a dead holder's lock is taken over.
 * @param {string} lock a folder that stands for the lock
 * @param {() => unknown} work
 */
export async function inTurn(lock, work) {
  while (!take(lock)) await pause(LOOK_AGAIN_MS);
  try {
    await work();
  } finally {
    rmSync(lock, { recursive: true, force: true });
  }
}

function take(lock) {
  try {
    mkdirSync(lock);
  } catch {
    if (holderIsGone(lock)) rmSync(lock, { recursive: true, force: true });
    return false;
  }
  writeFileSync(`${lock}/pid`, String(process.pid));
  return true;
}

function holderIsGone(lock) {
  try {
    process.kill(Number(readFileSync(`${lock}/pid`, "utf8")), 0);
    return false;
  } catch (error) {
    // Without a pid file the holder is just about to write it.
    return error.code === "ESRCH";
  }
}
