import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { database } from "../../lib/database/client";
import { addPerson } from "../../lib/server/auth";
import {
  type ActingMember,
  actingMember,
  carriesSession,
  provePassword,
  signIn,
  signOut,
} from "../../lib/server/sign-in";
import { type FreshDatabase, freshDatabase } from "../fresh-database";
import { TEST_SECRET } from "../server-process";

const PASSWORD = "a long enough one";
const noHeaders = new Headers();
let fresh: FreshDatabase;

beforeAll(async () => {
  fresh = await freshDatabase();
  process.env["DATABASE_URL"] = fresh.url;
  process.env["AMPERSIGN_SECRET"] = TEST_SECRET;
});

afterAll(async () => {
  await database().$disconnect();
  await fresh.drop();
});

async function member(name: string): Promise<string> {
  const email = `${name}@shop.example`;
  const userId = await addPerson({ name, email, password: PASSWORD });
  const { id: workspaceId } = await database().workspace.create({ data: { name: `${name}'s` } });
  await database().member.create({ data: { userId, workspaceId, roles: ["reviewer"] } });
  return email;
}

async function cookieOf(email: string, password = PASSWORD): Promise<Headers> {
  const opened = await signIn({ email, password, headers: noHeaders });
  if (!opened.ok) throw new Error(opened.error);
  return new Headers({ cookie: opened.value.map((one) => one.split(";", 1)[0]).join("; ") });
}

async function acting(email: string): Promise<ActingMember> {
  const found = await actingMember(await cookieOf(email));
  if (!found.ok) throw new Error(found.error);
  return found.value;
}

describe("signing in", () => {
  it("tells who acts, in which workspace, with which roles", async () => {
    const email = await member("Ada");
    expect(await acting(email)).toMatchObject({ name: "Ada", roles: ["reviewer"] });
    expect(await acting(email.toUpperCase())).toMatchObject({ name: "Ada" });
  });

  it("gives an unknown address and a wrong password the same answer", async () => {
    const email = await member("Ben");
    const wrong = await signIn({ email, password: `${PASSWORD}!`, headers: noHeaders });
    const unknown = await signIn({ email: `x${email}`, password: PASSWORD, headers: noHeaders });
    expect(wrong).toEqual({ ok: false, error: "wrongPassword" });
    expect(unknown).toEqual(wrong);
  });

  it("stops guessing after ten wrong passwords from one place, not for the owner elsewhere", async () => {
    const email = await member("Cleo");
    const from = (address: string, password: string) =>
      signIn({ email, password, headers: new Headers({ "x-ampersign-address": address }) });
    for (let tried = 0; tried < 10; tried += 1) {
      expect(await from("192.0.2.1", `guess ${tried}`)).toEqual({
        ok: false,
        error: "wrongPassword",
      });
    }
    expect(await from("192.0.2.1", PASSWORD)).toEqual({ ok: false, error: "tooManyAttempts" });
    expect((await from("192.0.2.2", PASSWORD)).ok).toBe(true);
  });

  it("shows nothing to someone who is in no workspace", async () => {
    await addPerson({ name: "Dan", email: "dan@shop.example", password: PASSWORD });
    expect(await actingMember(await cookieOf("dan@shop.example"))).toEqual({
      ok: false,
      error: "notAMember",
    });
  });
});

describe("a session", () => {
  it("opens nothing when it is absent, forged or signed with another secret", async () => {
    const email = await member("Eve");
    const good = (await cookieOf(email)).get("cookie") ?? "";
    const forged = good.replace(/\.[^.]*$/, ".c2lnbmF0dXJl");
    expect(forged).not.toBe(good);
    for (const cookie of ["", "ampersign.session_token=x", forged]) {
      expect(await actingMember(new Headers({ cookie }))).toEqual({
        ok: false,
        error: "signedOut",
      });
    }
  });

  it("ends at its time, and the request still tells that there was one", async () => {
    const headers = await cookieOf(await member("Fay"));
    await database().session.updateMany({
      where: { user: { name: "Fay" } },
      data: { expiresAt: new Date(Date.now() - 1000) },
    });
    expect(await actingMember(headers)).toEqual({ ok: false, error: "signedOut" });
    expect(carriesSession(headers)).toBe(true);
    expect(carriesSession(noHeaders)).toBe(false);
  });

  it("is gone after signing out, for who kept the cookie too", async () => {
    const headers = await cookieOf(await member("Gil"));
    expect((await actingMember(headers)).ok).toBe(true);
    expect((await signOut(headers)).join()).toContain("Max-Age=0");
    expect(await actingMember(headers)).toEqual({ ok: false, error: "signedOut" });
  });
});

describe("proving a password again", () => {
  it("takes the member's own password and no other, and stops guessing", async () => {
    await member("Hal");
    const hal = await acting("hal@shop.example");
    expect(await provePassword(hal, PASSWORD)).toMatchObject({
      ok: true,
      value: { user: hal.user, method: "password" },
    });
    for (let tried = 0; tried < 10; tried += 1) {
      expect(await provePassword(hal, `guess ${tried}`)).toEqual({
        ok: false,
        error: "wrongPassword",
      });
    }
    expect(await provePassword(hal, PASSWORD)).toEqual({ ok: false, error: "tooManyAttempts" });
  });
});
