import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";

/**
 * Whether node_modules holds what package-lock.json says: npm writes there what it installed. What is optional may be
 * absent, since it is meant for another machine.
 */
export function isInstalled(root) {
  const record = join(root, "node_modules/.package-lock.json");
  if (!existsSync(record)) return false;
  const wanted = JSON.parse(readFileSync(join(root, "package-lock.json"), "utf8")).packages;
  const found = JSON.parse(readFileSync(record, "utf8")).packages;
  return Object.entries(wanted).every(
    ([path, entry]) =>
      path === "" ||
      (found[path] === undefined ? entry.optional === true : found[path].version === entry.version),
  );
}
