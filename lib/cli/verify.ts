import { readFile } from "node:fs/promises";
import { readSealedRecord } from "../record/read-record";
import { verifyRecord } from "../record/verify";

/** `npm run --silent verify -- RECORD.json`: exit 0 and `holds: true`, 1 with what does not hold, 2 for what is no record. */
async function main(file: string | undefined): Promise<number> {
  if (file === undefined) {
    process.stderr.write("Name the record: npm run --silent verify -- RECORD.json\n");
    return 2;
  }
  const text = await readFile(file, "utf8").catch(() => null);
  if (text === null) {
    process.stderr.write(`${file} cannot be read.\n`);
    return 2;
  }
  const read = readSealedRecord(text);
  if (!read.ok) {
    print({ holds: false, checks: [{ check: "form", holds: false, message: read.error }] });
    return 2;
  }
  const verdict = await verifyRecord(read.value);
  print(verdict);
  return verdict.holds ? 0 : 1;
}

function print(value: unknown): void {
  process.stdout.write(`${JSON.stringify(value, null, 1)}\n`);
}

process.exitCode = await main(process.argv[2]);
