import { connect, type PrismaClient } from "../../lib/database/client";
import { PostgresDocumentStore } from "../../lib/database/document-store";
import { freshDatabase } from "../fresh-database";

/** A database with a workspace, for tests of shared documents. */
export interface DocumentBench {
  readonly url: string;
  readonly client: PrismaClient;
  readonly store: PostgresDocumentStore;
  /** @returns the id of a new, empty design */
  newDesign(): Promise<string>;
  drop(): Promise<void>;
}

export async function documentBench(): Promise<DocumentBench> {
  const database = await freshDatabase();
  const client = connect(database.url);
  const { id: workspaceId } = await client.workspace.create({ data: { name: "Bench" } });
  let made = 0;
  return {
    url: database.url,
    client,
    store: new PostgresDocumentStore(client, database.url),
    newDesign: async () => {
      made += 1;
      const data = { workspaceId, number: `T-${made}`, title: "Test" };
      return (await client.design.create({ data })).id;
    },
    drop: async () => {
      await client.$disconnect();
      await database.drop();
    },
  };
}
