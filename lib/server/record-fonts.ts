import { mkdtemp, readFile, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { decompress } from "wawoff2";

/** The complete IBM Plex files that the pages use too: the PDF library's own fonts lack arrows and ticks. */
const FILES = ["ibm-plex-sans-400", "ibm-plex-sans-600", "ibm-plex-cond-500", "ibm-plex-mono-500"];

/** The fonts as TrueType files in a folder of this process, and the families that the PDF names. */
export interface RecordFonts {
  readonly folder: string;
  readonly families: Readonly<Record<string, { readonly normal: string; readonly bold?: string }>>;
}

let fonts: Promise<RecordFonts> | undefined;

/**
 * Unpacks the fonts once. The PDF library reads WOFF2, but cannot take a subset of composite glyphs
 * from it (fontkit: "Offset is outside the bounds of the DataView"); from TrueType it can.
 */
export function recordFonts(): Promise<RecordFonts> {
  fonts ??= unpack();
  return fonts;
}

async function unpack(): Promise<RecordFonts> {
  const folder = await mkdtemp(join(tmpdir(), "ampersign-fonts-"));
  for (const name of FILES) {
    const packed = await readFile(resolve("app/look/fonts", `${name}.woff2`));
    await writeFile(join(folder, `${name}.ttf`), await decompress(packed));
  }
  const file = (name: string): string => join(folder, `${name}.ttf`);
  return {
    folder,
    families: {
      Sans: { normal: file("ibm-plex-sans-400"), bold: file("ibm-plex-sans-600") },
      Cond: { normal: file("ibm-plex-cond-500") },
      Mono: { normal: file("ibm-plex-mono-500") },
    },
  };
}
