import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import * as Y from "yjs";
import { topLevel } from "../../lib/document/shape";
import { presenceMessage, SAVED, syncMessage } from "../../lib/document/wire";
import { CAPS } from "../../lib/server/document-caps";
import { type DocumentBench, documentBench } from "./document-bench";
import { type DocumentServer, startDocumentServer } from "./document-server";
import { headerRoles } from "./header-sessions";
import { HeldClock } from "./held-clock";
import { PageLine } from "./page-line";

const PRESENCE = 1;
let bench: DocumentBench;
let server: DocumentServer;
let clock: HeldClock;
let design: string;
/** Another person, who has to notice nothing. */
let bob: PageLine;

beforeAll(async () => {
  bench = await documentBench();
});

beforeEach(async () => {
  clock = new HeldClock();
  design = await bench.newDesign();
  server = await startDocumentServer({ store: bench.store, clock });
  bob = await opened("bob designer");
});

afterEach(async () => {
  bob.draw("last");
  await bob.allSaved();
  await bob.close();
  headerRoles.clear();
  await server.stop();
});

afterAll(() => bench.drop());

async function opened(user: string): Promise<PageLine> {
  const line = new PageLine(`${server.url}/${design}`, user);
  await line.ready();
  return line;
}

const codeOf = async (line: PageLine) => (await line.closed).code;

describe("caps: over one, the line is closed with its code, and the others go on", () => {
  it("frames: a burst, then a rate", async () => {
    const ann = await opened("ann designer");
    // Two went into the opening: the question and the answer.
    const left = CAPS.frames.burst - 2;
    for (let frame = 0; frame < left; frame++) ann.draw(`r${frame}`);
    await ann.allSaved();
    clock.pass(1000);
    for (let frame = 0; frame < CAPS.frames.perSecond; frame++) ann.draw(`s${frame}`);
    await ann.allSaved();
    ann.draw("over");
    expect(await codeOf(ann)).toBe(4529);
    expect([bob.has("s1"), bob.has("over")]).toEqual([true, false]);
  });

  it("questions for the whole document", async () => {
    const ann = await opened("ann designer");
    for (let again = 1; again <= CAPS.stateRequests.burst; again++)
      ann.send(syncMessage(0, new Uint8Array([0])));
    expect(await codeOf(ann)).toBe(4529);
  });

  it("whatever is sent before it is known who it is", async () => {
    const ann = new PageLine(`${server.url}/${design}`, "ann designer");
    ann.socket.once("open", () => {
      for (let frame = 0; frame <= CAPS.early.frames; frame++)
        ann.send(syncMessage(0, new Uint8Array([0])));
    });
    expect(await codeOf(ann)).toBe(4529);
  });

  it("a value and an update: refused", async () => {
    const ann = await opened("ann designer");
    ann.draw("r1", "x".repeat((64 << 10) + 1));
    expect(await codeOf(ann)).toBe(4403);
    const cem = await opened("cem designer");
    cem.doc.transact(() => {
      for (let part = 0; part < 20; part++) cem.draw(`r${part}`, "x".repeat(60 << 10));
    });
    expect(await codeOf(cem)).toBe(4403);
    expect(topLevel(bob.doc, "parts").size).toBe(0);
  });

  it("a message of any kind", async () => {
    const ann = await opened("ann designer");
    ann.send(syncMessage(2, new Uint8Array(CAPS.frameBytes)));
    // The line may be gone before the code has come.
    expect([1006, 1009]).toContain(await codeOf(ann));
  });

  it("what a page does not take off its line", async () => {
    const ann = await opened("ann designer");
    ann.socket.pause();
    const times = 40;
    for (let frame = 0; frame < times; frame++) {
      bob.doc.transact(() => {
        for (let part = 0; part < 14; part++) bob.draw(`r${part}`, "x".repeat(60 << 10));
      });
      await bob.allSaved();
    }
    ann.socket.resume();
    expect(await codeOf(ann)).toBe(4508);
  }, 60_000);

  it("an update that builds on what is not there: come back, and nothing is left pending", async () => {
    const ann = await opened("ann designer");
    const elsewhere = new Y.Doc();
    topLevel(elsewhere, "parts").set("r1", 1);
    const between = Y.encodeStateVector(elsewhere);
    topLevel(elsewhere, "parts").set("r2", 2);
    ann.send(syncMessage(2, Y.encodeStateAsUpdate(elsewhere, between)));
    expect(await codeOf(ann)).toBe(1012);
    const reader = await opened("rob reviewer");
    expect(reader.doc.store.pendingStructs).toBeNull();
    await reader.close();
  });
});

describe("presence", () => {
  const entry = (clientId: number, clock: number, id: string) =>
    presenceMessage([{ clientId, clock, state: JSON.stringify({ person: { id } }) }]);
  const heard = (line: PageLine) => line.heard.get(PRESENCE) ?? 0;
  /** All that was sent before has been handled when the answer is here. */
  const handled = async (line: PageLine) => {
    line.draw(`mark ${line.sent}`);
    await line.allSaved();
  };

  it("shows a page's own entry under its own name, and takes it off when the line ends", async () => {
    const ann = await opened("ann designer");
    ann.send(entry(ann.doc.clientID, 1, "ann"));
    await bob.until(() => heard(bob) === 1);
    await ann.close();
    await bob.until(() => heard(bob) === 2);
    expect(heard(bob)).toBe(2);
  });

  it("passes over another's client id, another's name, a second id and a long entry", async () => {
    const ann = await opened("ann designer");
    bob.draw("r1");
    await bob.allSaved();
    const { clientID } = ann.doc;
    ann.send(entry(bob.doc.clientID, 9, "ann"));
    ann.send(entry(clientID, 1, "bob"));
    ann.send(entry(clientID, 1, "ann".repeat(CAPS.presenceBytes)));
    await handled(ann);
    expect(heard(bob)).toBe(0);
    ann.send(entry(clientID, 1, "ann"));
    ann.send(entry(clientID + 1, 1, "ann"));
    await handled(ann);
    await bob.until(() => bob.has(`mark ${ann.sent - 1}`));
    expect(heard(bob)).toBe(1);
    await ann.close();
  });

  it("passes over what is faster than its rate", async () => {
    const ann = await opened("ann designer");
    for (let move = 0; move < CAPS.presence.burst + 20; move++)
      ann.send(entry(ann.doc.clientID, move, "ann"));
    await handled(ann);
    await bob.until(() => bob.has(`mark ${ann.sent - 1}`));
    expect(heard(bob)).toBe(CAPS.presence.burst);
    clock.pass(1000);
    for (let move = 0; move < CAPS.presence.burst; move++)
      ann.send(entry(ann.doc.clientID, 100 + move, "ann"));
    await handled(ann);
    await bob.until(() => bob.has(`mark ${ann.sent - 1}`));
    expect(heard(bob)).toBe(CAPS.presence.burst + CAPS.presence.perSecond);
    await ann.close();
  });
});

describe("rights and the quiet line", () => {
  it("closes the line of who may see the design no longer: when rights change, and within a minute", async () => {
    const [ann, cem] = [await opened("ann designer"), await opened("cem designer")];
    headerRoles.set("ann", null);
    await server.sockets.recheckRights();
    expect(await codeOf(ann)).toBe(4403);
    headerRoles.set("cem", null);
    clock.pass(60_000);
    expect(await codeOf(cem)).toBe(4403);
  });

  it("refuses the next edit of who may only look now", async () => {
    const ann = await opened("ann designer");
    headerRoles.set("ann", ["observer"]);
    await server.sockets.recheckRights();
    ann.draw("r1");
    expect(await codeOf(ann)).toBe(4403);
    expect(bob.has("r1")).toBe(false);
  });

  it("repeats how much is stored, so that a page does not give a quiet line up", async () => {
    const before = bob.heard.get(SAVED) ?? 0;
    clock.pass(15_000);
    await bob.until(() => (bob.heard.get(SAVED) ?? 0) === before + 1);
    expect(bob.saved).toBe(1);
  });
});
