// Makes the database client from prisma/schema.prisma. It is not in git. Nothing is downloaded: Prisma wants the path of
// an engine that this command never runs, so it is given Node's own.
import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";

const digest = createHash("sha256")
  .update(readFileSync("prisma/schema.prisma"))
  .update(readFileSync("package-lock.json"))
  .digest("hex");
const stamp = ".build/generated";
const made =
  existsSync("lib/database/generated/client.ts") &&
  existsSync(stamp) &&
  readFileSync(stamp, "utf8") === digest;

if (!made) {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    ["node_modules/prisma/build/index.js", "generate", "--schema", "prisma/schema.prisma"],
    {
      encoding: "utf8",
      env: {
        ...process.env,
        PRISMA_SCHEMA_ENGINE_BINARY: process.execPath,
        PRISMA_HIDE_UPDATE_MESSAGE: "1",
        CHECKPOINT_DISABLE: "1",
      },
    },
  );
  if (status === 0) {
    mkdirSync(".build", { recursive: true });
    writeFileSync(stamp, digest);
  } else {
    process.stderr.write(`The database client could not be made.\n${stdout}${stderr}`);
    process.exitCode = 1;
  }
}
