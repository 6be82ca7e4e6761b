import { once } from "node:events";
import { createServer, type Server } from "node:http";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { secureHeaders } from "../../lib/server/security-headers";

let server: Server;
let address: string;

beforeAll(async () => {
  server = createServer((request, response) => {
    secureHeaders(request, response, { development: false, overHttps: request.url === "/https" });
    // What Next would read the number from.
    response.end(String(request.headers["content-security-policy"]));
  }).listen(0, "127.0.0.1");
  await once(server, "listening");
  const found = server.address();
  if (found === null || typeof found === "string") throw new Error("No port.");
  address = `http://127.0.0.1:${found.port}`;
});

afterAll(() => server.close());

describe("the headers of every answer", () => {
  it("let a page load nothing from elsewhere and stand in no strange frame", async () => {
    const { headers } = await fetch(address);
    const policy = headers.get("content-security-policy") ?? "";
    expect(policy).toContain("default-src 'self'");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toMatch(/https?:|\*|'unsafe-eval'|script-src[^;]*'unsafe-inline'/);
    expect(headers.get("x-content-type-options")).toBe("nosniff");
  });

  it("give the page's own scripts a number used once, whatever policy the client sent", async () => {
    const answers = await Promise.all(
      [1, 2].map(() => fetch(address, { headers: { "content-security-policy": "script-src *" } })),
    );
    const policies = answers.map(({ headers }) => headers.get("content-security-policy"));
    const seen = await Promise.all(answers.map((answer) => answer.text()));
    expect(seen).toEqual(policies);
    expect(new Set(policies).size).toBe(2);
  });

  it("demand HTTPS for a year where it is spoken, and only there", async () => {
    const plain = await fetch(address);
    expect(plain.headers.get("strict-transport-security")).toBeNull();
    const over = await fetch(`${address}/https`);
    expect(over.headers.get("strict-transport-security")).toBe("max-age=31536000");
  });
});
