/**
 * Accounts, passwords and sessions. The tables are better-auth's: the models User, Session, Account and Verification of
 * prisma/schema.prisma carry exactly the fields its Prisma adapter asks for.
 */
import { betterAuth } from "better-auth";
import { prismaAdapter } from "better-auth/adapters/prisma";
import { database, type PrismaClient } from "../database/client";
import { settings } from "./settings";

const HOUR_S = 3600;

/** Longest time without a visit after which one has to sign in again. */
const SESSION_S = 12 * HOUR_S;

export type Authentication = ReturnType<typeof createAuthentication>;

declare global {
  // Next loads a module several times over.
  var ampersignAuthentication: Authentication | undefined;
}

function createAuthentication(client: PrismaClient) {
  const { secret, publicUrl } = settings();
  return betterAuth({
    database: prismaAdapter(client, { provider: "postgresql" }),
    secret,
    baseURL: publicUrl ?? "http://127.0.0.1",
    emailAndPassword: { enabled: true, disableSignUp: true, minPasswordLength: 10 },
    session: { expiresIn: SESSION_S, updateAge: HOUR_S },
    advanced: {
      cookiePrefix: "ampersign",
      useSecureCookies: publicUrl?.startsWith("https:") ?? false,
      // Ours, set from the socket: whatever a client claims under this name is overwritten.
      ipAddress: { ipAddressHeaders: ["x-ampersign-address"] },
    },
    // Its own limit counts by address alone; lib/server/attempts.ts counts failures.
    rateLimit: { enabled: false },
    telemetry: { enabled: false },
    logger: { disabled: true },
  });
}

/** The one instance of this process; made at the first call, since a build has no database. */
export function authentication(): Authentication {
  globalThis.ampersignAuthentication ??= createAuthentication(database());
  return globalThis.ampersignAuthentication;
}

/** Makes an account; there is no sign-up of one's own. @returns the user's id */
export async function addPerson(person: {
  readonly name: string;
  readonly email: string;
  readonly password: string;
}): Promise<string> {
  const { internalAdapter, password } = await authentication().$context;
  const user = await internalAdapter.createUser(
    { name: person.name, email: person.email.toLowerCase(), emailVerified: true },
    { method: "admin" },
  );
  await internalAdapter.linkAccount({
    userId: user.id,
    providerId: "credential",
    accountId: user.id,
    password: await password.hash(person.password),
  });
  return user.id;
}
