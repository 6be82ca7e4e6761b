import fc from "fast-check";
import { describe, expect, it } from "vitest";
import * as Y from "yjs";
import { decisionUpdate } from "../../lib/document/decision-update";
import { OWN_EDIT, undoOf } from "../../lib/document/edits";
import { addRemark, raiseFinding, readDecisions } from "../../lib/document/findings";
import { type GuardedWriter, inspect } from "../../lib/document/guard";
import { TOP_LEVEL, topLevel } from "../../lib/document/shape";

const DAMAGED = Number(process.env["AMPERSIGN_DAMAGED_UPDATES"] ?? 8000);
const AT = "2026-03-02T09:00:00.000Z";
const words = { anchor: { net: "OUT" }, severity: "minor", text: "Why?", was: null } as const;

function addPart(doc: Y.Doc, id: string): void {
  const part = new Y.Map<unknown>();
  topLevel(doc, "parts").set(id, part);
  part.set("at", [1, 2, 0, false]);
  part.set("params", new Y.Map([["resistance", "4k7"]]));
}

function base(): { readonly state: Uint8Array; readonly finding: string } {
  const doc = new Y.Doc();
  for (let part = 0; part < 30; part++) addPart(doc, `p${part}`);
  const finding = raiseFinding(doc, { ...words, author: "ann", revision: "A", at: AT });
  topLevel(doc, "decisions").set("d", 1);
  topLevel(doc, "parts").delete("p3");
  return { state: Y.encodeStateAsUpdate(doc), finding };
}

const { state, finding } = base();

function copy(): Y.Doc {
  const doc = new Y.Doc();
  Y.applyUpdate(doc, state);
  return doc;
}

const server = copy();
const known = new Set(server.store.clients.keys());

function writer(role: GuardedWriter["roles"][number], user = "rob"): GuardedWriter {
  return { user, roles: [role], owns: (client) => !known.has(client) };
}

function frame(change: (doc: Y.Doc) => void): Uint8Array {
  const doc = copy();
  const before = Y.encodeStateVector(doc);
  doc.transact(() => change(doc));
  return Y.encodeStateAsUpdate(doc, before);
}

function verdict(update: Uint8Array, by: GuardedWriter): string {
  const judged = inspect(server, update, by);
  return judged.ok ? "taken" : judged.error.kind;
}

const remarksOf = (doc: Y.Doc): Y.Array<unknown> => {
  const map = topLevel(doc, "findings").get(finding);
  const remarks = map instanceof Y.Map ? map.get("remarks") : null;
  if (!(remarks instanceof Y.Array)) throw new Error("The finding has no remarks.");
  return remarks;
};

function withoutFindings(doc: Y.Doc): string {
  const kept = TOP_LEVEL.filter((name) => name !== "findings");
  const found = topLevel(doc, "findings").get(finding);
  const fixed = found instanceof Y.Map ? { ...found.toJSON(), remarks: [] } : null;
  return JSON.stringify([fixed, ...kept.map((name) => topLevel(doc, name).toJSON())]);
}

describe("who may write what", () => {
  const remark = (doc: Y.Doc) => addRemark(doc, finding, { author: "rob", at: AT, text: "Yes." });
  const raise = (doc: Y.Doc, author: string) =>
    raiseFinding(doc, { ...words, author, revision: "A", at: AT });

  it("[WW1] lets designers alone draw", () => {
    const drawn = frame((doc) => addPart(doc, "new"));
    expect(verdict(drawn, writer("designer"))).toBe("taken");
    for (const role of ["reviewer", "approver", "observer"] as const)
      expect(verdict(drawn, writer(role))).toBe("forbidden");
  });

  it("[WW2] takes findings and remarks under the writer's own name alone", () => {
    expect(
      verdict(
        frame((doc) => raise(doc, "rob")),
        writer("reviewer"),
      ),
    ).toBe("taken");
    expect(verdict(frame(remark), writer("approver"))).toBe("taken");
    expect(verdict(frame(remark), writer("observer"))).toBe("forbidden");
    expect(
      verdict(
        frame((doc) => raise(doc, "ann")),
        writer("reviewer"),
      ),
    ).toBe("forbidden");
    expect(verdict(frame(remark), writer("reviewer", "eve"))).toBe("forbidden");
  });

  it("[WW2] keeps findings: nothing in them is changed, replaced or deleted, by their author neither", () => {
    const attacks: readonly ((doc: Y.Doc) => void)[] = [
      (doc) => topLevel(doc, "findings").delete(finding),
      (doc) => topLevel(doc, "findings").set(finding, new Y.Map([["author", "ann"]])),
      (doc) => {
        const map = topLevel(doc, "findings").get(finding);
        if (map instanceof Y.Map) map.set("text", "Never mind.");
      },
    ];
    for (const attack of attacks)
      expect(verdict(frame(attack), writer("designer", "ann"))).toBe("forbidden");
  });

  it("[WW3] lets the server alone write decisions", () => {
    const decision = {
      kind: "release",
      id: "d1",
      user: "ann",
      at: AT,
      revision: "A",
      findings: [],
    } as const;
    const update = decisionUpdate(decision);
    expect(verdict(update, writer("designer", "ann"))).toBe("forbidden");
    const doc = new Y.Doc();
    Y.applyUpdate(doc, update);
    expect(readDecisions(doc)).toEqual([decision]);
  });

  it("refuses what a page never sends", () => {
    const by = writer("designer");
    const bad: readonly ((doc: Y.Doc) => void)[] = [
      (doc) => doc.getMap("elsewhere").set("a", 1),
      (doc) => topLevel(doc, "parts").set("__proto__", 1),
      (doc) => topLevel(doc, "parts").set("a", new Uint8Array(2)),
      (doc) => topLevel(doc, "parts").set("a", new Y.Doc()),
      (doc) => topLevel(doc, "parts").set("a", Number.NaN),
      (doc) => topLevel(doc, "parts").set("a", "x".repeat((64 << 10) + 1)),
      (doc) => topLevel(doc, "design").set("schema", 2),
    ];
    for (const change of bad) expect(verdict(frame(change), by)).toBe("forbidden");
    expect(verdict(new Uint8Array([9, 9, 9]), by)).toBe("malformed");
    expect(verdict(new Uint8Array((1 << 20) + 1), by)).toBe("tooLarge");
    // No structs; of one client, one deleted range, which is not here.
    expect(verdict(new Uint8Array([0, 1, 99, 1, 0, 5]), by)).toBe("missing");
  });

  it("refuses a client id of another person, and asks where it is not known", () => {
    const drawn = frame((doc) => addPart(doc, "new"));
    expect(verdict(drawn, { ...writer("designer"), owns: () => false })).toBe("forbidden");
    expect(verdict(drawn, { ...writer("designer"), owns: () => null })).toBe("unclaimed");
  });

  it("sends a page with a gap back", () => {
    const doc = copy();
    addPart(doc, "first");
    const between = Y.encodeStateVector(doc);
    addPart(doc, "second");
    expect(verdict(Y.encodeStateAsUpdate(doc, between), writer("designer"))).toBe("missing");
  });
});

describe("damaged updates", () => {
  const samples = [
    frame((doc) => addPart(doc, "n")),
    frame((doc) => topLevel(doc, "parts").delete("p2")),
    frame((doc) => raiseFinding(doc, { ...words, author: "rob", revision: "A", at: AT })),
    frame((doc) => remarksOf(doc).push([{ id: "r", author: "rob", at: AT, text: "Hm." }])),
  ];
  const damage = fc.array(fc.tuple(fc.nat(), fc.integer({ min: 0, max: 255 })), {
    minLength: 1,
    maxLength: 3,
  });

  it("change nothing that a reviewer may not change, and leave nothing pending", () => {
    const before = withoutFindings(copy());
    let refused = 0;
    fc.assert(
      fc.property(fc.constantFrom(...samples), damage, (sample, hits) => {
        const update = sample.slice();
        for (const [at, byte] of hits) update[at % update.length] = byte;
        const doc = copy();
        if (!inspect(doc, update, writer("reviewer")).ok) {
          refused += 1;
          return;
        }
        Y.applyUpdate(doc, update);
        expect(doc.store.pendingStructs).toBeNull();
        expect(doc.store.pendingDs).toBeNull();
        expect(withoutFindings(doc)).toBe(before);
        for (const name of doc.share.keys()) expect(TOP_LEVEL).toContain(name);
      }),
      { numRuns: DAMAGED },
    );
    expect(refused).toBeGreaterThan(DAMAGED / 10);
  }, 300_000);
});

describe("honest pages", () => {
  it("are never refused: undo, redo, offline spells and stale resyncs included", () => {
    const step = fc.tuple(fc.nat(2), fc.nat(9), fc.nat(1000));
    let frames = 0;
    fc.assert(
      fc.property(fc.array(step, { minLength: 100, maxLength: 250 }), (steps) => {
        const held = copy();
        const pages = [0, 1, 2].map((index) => {
          const doc = copy();
          return { doc, undo: undoOf(doc), online: true, user: `u${index}` };
        });
        type Page = (typeof pages)[number];
        const offer = (page: Page, update: Uint8Array) => {
          frames += 1;
          const by = { user: page.user, roles: ["designer"] as const, owns: () => true };
          expect(inspect(held, update, by)).toEqual({ ok: true, value: null });
          Y.applyUpdate(held, update, page);
          expect(held.store.pendingStructs).toBeNull();
        };
        held.on("update", (update: Uint8Array, origin: unknown) => {
          for (const page of pages)
            if (page !== origin && page.online) Y.applyUpdate(page.doc, update, "remote");
        });
        for (const page of pages)
          page.doc.on("update", (update: Uint8Array, origin: unknown) => {
            if (origin !== "remote" && page.online) offer(page, update);
          });
        const rejoin = (page: Page) => {
          page.online = true;
          offer(page, Y.encodeStateAsUpdate(page.doc, Y.encodeStateVector(held)));
          const rest = Y.encodeStateAsUpdate(held, Y.encodeStateVector(page.doc));
          Y.applyUpdate(page.doc, rest, "remote");
        };
        let stale = Y.encodeStateVector(held);
        for (const [who, what, seed] of steps) {
          const page = pages[who];
          if (page === undefined) continue;
          const parts = topLevel(page.doc, "parts");
          const ids = [...parts.keys()].sort();
          const id = ids[seed % ids.length] ?? "p0";
          const part = parts.get(id);
          if (what === 0) page.undo.undo();
          else if (what === 1) page.undo.redo();
          else if (what === 2 && page.online) page.online = seed % 3 !== 0;
          else if (what === 2) rejoin(page);
          else if (what === 3 && page.online) {
            offer(page, Y.encodeStateAsUpdate(page.doc, stale));
            stale = Y.encodeStateVector(held);
          } else
            page.doc.transact(() => {
              if (what < 6) addPart(page.doc, `n${who}${seed}${ids.length}`);
              else if (what === 6) parts.delete(id);
              else if (what === 7)
                raiseFinding(page.doc, { ...words, author: page.user, revision: "A", at: AT });
              else if (what === 8)
                addRemark(page.doc, finding, { author: page.user, at: AT, text: "So." });
              else if (part instanceof Y.Map) part.set("at", [seed, 0, 0, false]);
            }, OWN_EDIT);
        }
        for (const page of pages) rejoin(page);
      }),
      { numRuns: 12 },
    );
    expect(frames).toBeGreaterThan(500);
  }, 120_000);
});
