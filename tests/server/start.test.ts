import { spawn } from "node:child_process";
import { once } from "node:events";
import { createServer } from "node:net";
import { describe, expect, it } from "vitest";

/** Runs the start command to its end. */
async function start(port: string): Promise<{ readonly code: unknown; readonly said: string }> {
  const child = spawn(process.execPath, ["lib/server/start.mjs"], {
    env: { ...process.env, PORT: port },
    stdio: ["ignore", "pipe", "pipe"],
  });
  let said = "";
  child.stdout.on("data", (chunk) => {
    said += String(chunk);
  });
  child.stderr.on("data", (chunk) => {
    said += String(chunk);
  });
  const [code] = await once(child, "close");
  return { code, said };
}

describe("the start command, before it does anything", () => {
  it("says in one sentence that the port is taken, and what to do", async () => {
    const other = createServer().listen(0, "127.0.0.1");
    await once(other, "listening");
    const address = other.address();
    const port = address !== null && typeof address === "object" ? address.port : 0;
    expect(await start(String(port))).toEqual({
      code: 1,
      said: `Port ${port} is taken by another program. Choose another one: PORT=${port + 1} npm start\n`,
    });
    other.close();
  });

  it.each(["http", "70000", "3.5"])("refuses PORT=%s", async (port) => {
    expect(await start(port)).toEqual({
      code: 1,
      said: `PORT must be a whole number from 0 to 65535, not ${port}.\n`,
    });
  });
});
