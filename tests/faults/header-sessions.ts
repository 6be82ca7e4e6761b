import type { Role } from "../../lib/review/review-state";
import type { Sessions } from "../../lib/server/document-store";

/** Roles by user, as `x-user` headers have told them; a test may take them away again. */
export const headerRoles = new Map<string, readonly Role[] | null>();

/** Believes the header `x-user: NAME ROLE`. */
export const headerSessions: Sessions = {
  authenticate: async (request) => {
    const said = request.headers["x-user"];
    const [userId = "", role = ""] = typeof said === "string" ? said.split(" ") : [];
    if (userId === "") return null;
    if (!headerRoles.has(userId) && isRole(role)) headerRoles.set(userId, [role]);
    return { userId, name: userId };
  },
  rights: async (userId) => headerRoles.get(userId) ?? null,
};

function isRole(word: string): word is Role {
  return ["designer", "reviewer", "approver", "observer"].includes(word);
}
