import type { ServerResponse } from "node:http";
import { database } from "../database/client";
import { log } from "./log";

/**
 * Answers `/healthz` (this process lives) and `/readyz` (it reaches its database), for whoever watches over it.
 * @returns whether the path was one of them
 */
export function answerHealth(path: string, response: ServerResponse): boolean {
  if (path === "/healthz") {
    answer(response, 200, "alive");
    return true;
  }
  if (path !== "/readyz") return false;
  database().$queryRaw`select 1`.then(
    () => answer(response, 200, "ready"),
    (error: unknown) => {
      log.error({ error }, "the database does not answer");
      answer(response, 503, "the database does not answer");
    },
  );
  return true;
}

function answer(response: ServerResponse, status: number, text: string): void {
  response.writeHead(status, { "content-type": "text/plain", "cache-control": "no-store" });
  response.end(`${text}\n`);
}
