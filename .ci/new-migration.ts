/**
 * Writes the migration that leads from prisma/migrations to prisma/schema.prisma: npx tsx .ci/new-migration.ts NAME
 * It uses a database of its own that is thrown away. Read the SQL before it is committed; add triggers by hand below it.
 */
import {
  chmodSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from "node:fs";
import { createRequire } from "node:module";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { PrismaPg } from "@prisma/adapter-pg";
import { bindMigrationAwareSqlAdapterFactory, ColumnTypeEnum } from "@prisma/driver-adapter-utils";
import * as engine from "@prisma/schema-engine-wasm/schema_engine_bg";
import { startPostgres } from "../lib/database/embedded-postgres";
import { readMigrations } from "../lib/database/migrate";

const SCHEMA = "prisma/schema.prisma";
const MIGRATIONS = "prisma/migrations";
const CHAR_OID = 18;
const CHAR_ARRAY_OID = 1002;

const require = createRequire(import.meta.url);

/**
 * The engine reads catalogue columns of Postgres's internal "char", which the adapter does not know. They are passed
 * off as arrays of it, which it does know, and {@link Authoring} names them rightly.
 */
function letInternalCharPass(): void {
  const Result = require("pg/lib/result.js");
  const addFields = Result.prototype.addFields;
  Result.prototype.addFields = function add(fields: { dataTypeID: number }[]) {
    addFields.call(this, fields);
    for (const field of fields)
      if (field.dataTypeID === CHAR_OID) field.dataTypeID = CHAR_ARRAY_OID;
  };
}

type Adapter = Awaited<ReturnType<PrismaPg["connect"]>>;

class Authoring extends PrismaPg {
  override async connect(): Promise<Adapter> {
    return corrected(await super.connect());
  }
  override async connectToShadowDb(): Promise<Adapter> {
    return corrected(await super.connectToShadowDb());
  }
}

/** The adapter would cut a script at every semicolon, those inside the body of a trigger function too. */
function corrected(adapter: Adapter): Adapter {
  const queryRaw = adapter.queryRaw.bind(adapter);
  adapter.queryRaw = async (query) => {
    const found = await queryRaw(query);
    const columnTypes = found.columnTypes.map((type) =>
      type === ColumnTypeEnum.CharacterArray ? ColumnTypeEnum.Character : type,
    );
    return { ...found, columnTypes };
  };
  adapter.executeScript = async (script) => {
    await adapter.underlyingDriver().query(script);
  };
  return adapter;
}

/** Node 20 does not import WebAssembly by itself. */
async function loadEngine(): Promise<void> {
  const file = require
    .resolve("@prisma/schema-engine-wasm/schema_engine_bg")
    .replace(/[.]js$/, ".wasm");
  const { instance } = await WebAssembly.instantiate(readFileSync(file), {
    "./schema_engine_bg.js": engine,
  } as unknown as WebAssembly.Imports);
  engine.__wbg_set_wasm(instance.exports);
  const start = instance.exports["__wbindgen_start"];
  if (typeof start === "function") start();
}

async function difference(url: string): Promise<string> {
  const factory = bindMigrationAwareSqlAdapterFactory(new Authoring({ connectionString: url }));
  const schema = { path: SCHEMA, content: readFileSync(SCHEMA, "utf8") };
  const made = await engine.SchemaEngine.new(
    { datamodels: [[schema.path, schema.content]] },
    () => undefined,
    factory,
  );
  const result = await made.diff({
    from: {
      tag: "migrations",
      baseDir: MIGRATIONS,
      lockfile: {
        path: "migration_lock.toml",
        content: 'provider = "postgresql"\n',
      },
      shadowDbInitScript: "",
      migrationDirectories: (existsSync(MIGRATIONS) ? readMigrations(MIGRATIONS) : []).map(
        ({ name, sql }) => ({
          path: name,
          migrationFile: { path: "migration.sql", content: { tag: "ok", value: sql } },
        }),
      ),
    },
    to: { tag: "schemaDatamodel", files: [schema] },
    script: true,
    exitCode: true,
    filters: { externalTables: [], externalEnums: [] },
  });
  return result.exitCode === 0 ? "" : (result.stdout ?? "");
}

const name = process.argv[2];
if (name === undefined || !/^[a-z0-9-]+$/.test(name)) {
  throw new Error(
    "Give the migration a name in kebab-case: npx tsx .ci/new-migration.ts add-notices",
  );
}
letInternalCharPass();
await loadEngine();
const folder = mkdtempSync(join(tmpdir(), "ampersign-migration-"));
chmodSync(folder, 0o755);
const postgres = await startPostgres(join(folder, "postgres"), { fsync: "off" });
try {
  const sql = await difference(postgres.url);
  if (sql.trim() === "" || sql.includes("This is an empty migration")) {
    process.stdout.write("The migrations already lead to the schema: nothing written.\n");
  } else {
    const stamp = new Date().toISOString().replace(/\D/g, "").slice(0, 14);
    const target = join(MIGRATIONS, `${stamp}-${name}`);
    mkdirSync(target, { recursive: true });
    writeFileSync(join(target, "migration.sql"), sql);
    process.stdout.write(`${target}/migration.sql\n`);
  }
} finally {
  await postgres.stop();
  rmSync(folder, { recursive: true, force: true });
}
process.exit(0);
