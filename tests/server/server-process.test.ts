import { connect } from "node:net";
import { text } from "node:stream/consumers";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { database } from "../../lib/database/client";
import { addPerson } from "../../lib/server/auth";
import { signIn } from "../../lib/server/sign-in";
import { type FreshDatabase, freshDatabase } from "../fresh-database";
import { type ServerProcess, startServerProcess, TEST_SECRET } from "../server-process";

const BUILD_MS = 180_000;
const PASSWORD = "a long enough one";
let fresh: FreshDatabase;
let server: ServerProcess;
let cookie: string;

beforeAll(async () => {
  fresh = await freshDatabase();
  process.env["DATABASE_URL"] = fresh.url;
  process.env["AMPERSIGN_SECRET"] = TEST_SECRET;
  const userId = await addPerson({ name: "Ada", email: "ada@shop.example", password: PASSWORD });
  const { id: workspaceId } = await database().workspace.create({ data: { name: "Ada's" } });
  await database().member.create({ data: { userId, workspaceId, roles: ["reviewer"] } });
  const opened = await signIn({
    email: "ada@shop.example",
    password: PASSWORD,
    headers: new Headers(),
  });
  if (!opened.ok) throw new Error(opened.error);
  cookie = opened.value.map((one) => one.split(";", 1)[0]).join("; ");
  server = await startServerProcess({ databaseUrl: fresh.url });
}, BUILD_MS);

afterAll(async () => {
  await server.stop();
  await database().$disconnect();
  await fresh.drop();
});

function get(path: string, headers: Readonly<Record<string, string>> = {}): Promise<Response> {
  return fetch(server.url + path, { headers, redirect: "manual" });
}

/** What the server answers, to its end, to bytes that no client of ours would send. */
async function sendRaw(bytes: string): Promise<string> {
  const { hostname, port } = new URL(server.url);
  const socket = connect(Number(port), hostname);
  socket.write(bytes);
  return text(socket);
}

const upgrade = (path: string) =>
  `GET ${path} HTTP/1.1\r\nHost: x\r\nConnection: Upgrade\r\nUpgrade: websocket\r\n` +
  "Sec-WebSocket-Version: 13\r\nSec-WebSocket-Key: dGhlIHNhbXBsZSBub25jZQ==\r\n\r\n";

describe("the server", () => {
  it("keeps a session over kill -9 and a new start", async () => {
    expect((await get("/sign-in", { cookie })).headers.get("location")).toBe("/");
    const { port } = new URL(server.url);
    await server.kill();
    server = await startServerProcess({ databaseUrl: fresh.url, port: Number(port) });
    expect((await get("/sign-in", { cookie })).headers.get("location")).toBe("/");
    expect((await get("/sign-in")).headers.get("location")).toBeNull();
  });

  it("answers a stranger's path and upgrade with 404 and lives on", async () => {
    expect((await get("/no/such/page", { cookie })).status).toBe(404);
    for (const path of ["/", "/socket", "/_next/hmr", "/doc/unknown"]) {
      expect(await sendRaw(upgrade(path))).toMatch(/^HTTP\/1\.1 40[0-9] /);
    }
    expect((await get("/readyz")).status).toBe(200);
  });

  it("is not confused by damaged requests", async () => {
    expect(await sendRaw("GET /\\..\\.. NONSENSE\r\n\r\n")).toMatch(/^HTTP\/1\.1 400 /);
    expect((await get("//elsewhere.example/%ff%00")).status).toBeGreaterThanOrEqual(300);
    expect((await get("/healthz")).status).toBe(200);
  });

  it("takes the client's word for neither its address nor where it was", async () => {
    const answer = await get("/sign-out", {
      "x-ampersign-path": "/trap",
      cookie: "ampersign.session_token=x",
    });
    expect(answer.headers.get("location")).toBe("/sign-in?problem=expired");
  });
});
