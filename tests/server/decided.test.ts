import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { connect } from "../../lib/database/client";
import { auditChainFault } from "../../lib/record/audit-chain";
import { freezeRevision } from "../../lib/server/commands/freeze-revision";
import { returnRevision } from "../../lib/server/commands/return-revision";
import {
  checkItem,
  decideFinding,
  grantWaiver,
  withdrawWaiver,
} from "../../lib/server/commands/review-decisions";
import { signRevision } from "../../lib/server/commands/sign-revision";
import { draftView } from "../../lib/server/queries/draft-view";
import { recordInputs } from "../../lib/server/queries/record-inputs";
import { registerView } from "../../lib/server/queries/register-view";
import { reviewView } from "../../lib/server/queries/review-view";
import { runProgress } from "../../lib/server/queries/run-progress";
import { reviewOf } from "../../lib/server/review-of";
import { provePassword } from "../../lib/server/sign-in";
import { COIL, FAN, good, MINUTE_MS, PASSWORD, Shop } from "./shop";

let shop: Shop;

beforeAll(async () => {
  shop = await Shop.open();
}, 3 * MINUTE_MS);

afterAll(() => shop.close());

describe("what is decided", () => {
  it(
    "begins with a revision that the worker has solved",
    async () => {
      expect(await shop.freeze("First issue")).toBe("A");
      await shop.checkAll(shop.reviewer, "A");
    },
    MINUTE_MS,
  );

  it("show nothing of a workspace to another one's members", async () => {
    const about = { number: FAN, letter: "A" };
    const refused = { error: { kind: "notFound" } };
    const { revision } = good(await reviewOf(shop.designer, FAN, "A"));
    const proof = good(await provePassword(shop.outsider, PASSWORD));
    const answers = await Promise.all([
      reviewView(shop.outsider, FAN, "A"),
      draftView(shop.outsider, FAN),
      recordInputs(shop.outsider, FAN, "A"),
      runProgress(shop.outsider, revision.runAddress),
      freezeRevision(shop.outsider, { number: FAN, changeNote: "mine now" }),
      checkItem(shop.outsider, about, "R7.resistance", true),
      decideFinding(shop.outsider, about, "any", "closure", "why"),
      grantWaiver(shop.outsider, about, COIL, null, "why"),
      withdrawWaiver(shop.outsider, about, "W-1", "why"),
      returnRevision(shop.outsider, about, "why"),
      signRevision(shop.outsider, about, "approved", proof, {}),
    ]);
    for (const answer of answers) expect(answer).toMatchObject(refused);
    expect((await registerView(shop.outsider)).rows).toEqual([]);
  });

  it("lie whole in a record: every entry of the workspace's chain, as stored", async () => {
    const { audit } = good(await recordInputs(shop.designer, FAN, "A"));
    expect(auditChainFault(audit)).toBeNull();
    expect(audit[0]?.seq).toBe(1);
    const client = connect(shop.fresh.url);
    expect(audit).toHaveLength(await client.auditEntry.count());
    // A hole, as only the database's owner could tear it, is carried along for the verifier to find.
    await client.$executeRaw`alter table "AuditEntry" disable trigger audit_entry_stays`;
    const torn = await client.auditEntry.delete({
      where: { workspaceId_seq: { workspaceId: shop.designer.workspace, seq: 3 } },
    });
    const holed = good(await recordInputs(shop.designer, FAN, "A"));
    expect(holed.audit).toHaveLength(audit.length - 1);
    expect(auditChainFault(holed.audit)).toContain("missing between 2 and 4");
    await client.auditEntry.create({ data: { ...torn, payload: torn.payload ?? {} } });
    await client.$executeRaw`alter table "AuditEntry" enable trigger audit_entry_stays`;
    await client.$disconnect();
  });

  it("stand: neither rows nor finished runs can be changed, and the audit chain holds", async () => {
    const client = connect(shop.fresh.url);
    const { revision } = good(await reviewOf(shop.designer, FAN, "A"));
    const attempts = [
      client.decision.updateMany({ data: { kind: "check" } }),
      client.decision.deleteMany(),
      client.auditEntry.updateMany({ data: { actor: "nobody" } }),
      client.auditEntry.deleteMany(),
      client.revision.updateMany({ data: { circuit: "{}" } }),
      client.revision.updateMany({ data: { runAddress: "another" } }),
      client.solverRun.updateMany({ where: { state: "done" }, data: { result: "{}" } }),
      client.solverRun.deleteMany(),
      client.revision.create({
        data: { ...revision, id: "without", letter: "Z", runAddress: "no run" },
      }),
      client.$executeRaw`truncate "Decision"`,
    ];
    const ends = await Promise.allSettled(attempts);
    expect(ends.map(({ status }) => status)).toEqual(attempts.map(() => "rejected"));
    const entries = await client.auditEntry.findMany({
      where: { workspaceId: shop.designer.workspace },
      orderBy: { seq: "asc" },
    });
    await client.$disconnect();
    const chain = entries.map((entry) => ({ ...entry, at: entry.at.toISOString() }));
    expect(chain.length).toBeGreaterThan(20);
    expect(auditChainFault(chain)).toBeNull();
    const forged = chain.map((entry) => (entry.seq === 5 ? { ...entry, actor: "nobody" } : entry));
    expect(auditChainFault(forged)).toContain("audit entry 5");
    expect(auditChainFault(chain.filter(({ seq }) => seq !== 7))).toContain("missing between");
  });
});
