import type { IncomingMessage } from "node:http";
import { database } from "../database/client";
import type { Role } from "../review/review-state";
import { authentication } from "./auth";
import type { Sessions, SignedIn } from "./document-store";

const ROLES: readonly Role[] = ["designer", "reviewer", "approver", "observer"];

/** Who opens a document's socket, by the session cookie, and what they may do in the design's workspace. */
export const documentSessions: Sessions = {
  authenticate: async (request: IncomingMessage): Promise<SignedIn | null> => {
    const headers = new Headers();
    for (const [name, value] of Object.entries(request.headers))
      if (typeof value === "string") headers.set(name, value);
    const session = await authentication().api.getSession({ headers });
    return session === null ? null : { userId: session.user.id, name: session.user.name };
  },
  rights: async (userId, designId) => {
    const member = await database().member.findFirst({
      where: { userId, workspace: { designs: { some: { id: designId } } } },
      select: { roles: true },
    });
    return member === null ? null : ROLES.filter((role) => member.roles.includes(role));
  },
};
