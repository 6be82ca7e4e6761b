import { resolve, sep } from "node:path";
import pdfmake, { type Content, type TableCell } from "pdfmake";
import type { OutlineBlock, OutlineCell, RecordOutline } from "../record/record-outline";
import { recordFonts } from "./record-fonts";

type DocumentDefinition = Parameters<typeof pdfmake.createPdf>[0];

const INK = "#1b242e";
const INK_2 = "#4b5661";
const RED = "#a81e17";

/** Millimetres in points. */
const mm = (millimetres: number): number => (millimetres * 72) / 25.4;

/** Prints a record's outline as PDF on A4 with ISO 5457 margins; the digest and the key's thumbprint stand in section 9. */
export async function recordPdf(outline: RecordOutline): Promise<Uint8Array> {
  const { folder, families } = await recordFonts();
  pdfmake.setFonts({ ...families });
  pdfmake.setUrlAccessPolicy(() => false);
  pdfmake.setLocalAccessPolicy((path) => resolve(path).startsWith(folder + sep));
  return new Uint8Array(await pdfmake.createPdf(documentOf(outline)).getBuffer());
}

function documentOf(outline: RecordOutline): DocumentDefinition {
  return {
    pageSize: "A4",
    pageMargins: [mm(25), mm(16), mm(15), mm(26)],
    info: { title: `Design review record ${outline.heading}`, producer: "Ampersign" },
    defaultStyle: { font: "Sans", fontSize: 9, lineHeight: 1.2, color: INK },
    content: [
      {
        text: "DESIGN REVIEW RECORD",
        font: "Cond",
        fontSize: 8,
        color: INK_2,
        characterSpacing: 0.5,
      },
      {
        columns: [
          [
            { text: outline.heading, bold: true, fontSize: 19, margin: [0, 2, 0, 2] },
            { text: outline.introduction },
          ],
          {
            width: mm(44),
            table: {
              widths: ["*"],
              body: [
                [
                  {
                    stack: [
                      { text: outline.outcome.words, bold: true, fontSize: 13 },
                      { text: outline.outcome.detail },
                    ],
                    alignment: "center",
                    margin: [4, 4, 4, 4],
                  },
                ],
              ],
            },
          },
        ],
        columnGap: mm(6),
      },
      ...outline.sections.flatMap((section): Content[] => [
        {
          text: `${section.number}   ${section.title}`,
          bold: true,
          fontSize: 10.5,
          margin: [0, 12, 0, 3],
          headlineLevel: 1,
        },
        ...section.blocks.map(blockContent),
      ]),
    ],
    // A heading is not left alone at the foot of a page.
    pageBreakBefore: (node, nodes) =>
      node.headlineLevel === 1 && nodes.getFollowingNodesOnPage().length === 0,
    footer: (page, pages) => ({
      margin: [mm(25), 0, mm(15), 0],
      font: "Cond",
      fontSize: 8,
      table: {
        widths: [...outline.titleBlock.map(() => "auto"), "*"],
        body: [
          [
            ...outline.titleBlock.map(
              (entry): TableCell => ({
                stack: [{ text: entry.field, color: INK_2, fontSize: 7 }, { text: entry.value }],
              }),
            ),
            {
              stack: [{ text: "Sheet", color: INK_2, fontSize: 7 }, { text: `${page} / ${pages}` }],
            },
          ],
        ],
      },
    }),
  };
}

function blockContent(block: OutlineBlock): Content {
  switch (block.kind) {
    case "text":
      return { text: block.text };
    case "small":
      return { text: block.text, fontSize: 7.8, color: INK_2, margin: [0, 3, 0, 0] };
    case "list":
      return { ul: [...block.items], type: "square" };
    case "signatures":
      return {
        columns: block.signatures.map((signature) => ({
          stack: [
            { text: signature.meaning.toUpperCase(), font: "Cond", fontSize: 8, color: INK_2 },
            { text: signature.name, bold: true, fontSize: 12 },
            { text: signature.function },
            { text: signature.at, font: "Mono", fontSize: 8 },
            { text: signature.method, fontSize: 7.8, color: INK_2 },
            { text: signature.digest, font: "Mono", fontSize: 7 },
          ],
        })),
        columnGap: mm(4),
        unbreakable: true,
      };
    case "table":
      return tableContent(block);
  }
}

function tableContent(block: Extract<OutlineBlock, { kind: "table" }>): Content {
  const whole = block.widths.reduce((sum, width) => sum + width, 0);
  const head = block.head.map(
    (words): TableCell => ({ text: words, font: "Cond", fontSize: 8, color: INK_2 }),
  );
  return {
    margin: [0, 2, 0, 4],
    table: {
      headerRows: head.length > 0 ? 1 : 0,
      dontBreakRows: true,
      widths: block.widths.map((width) => `${((width / whole) * 100).toFixed(2)}%`),
      body: [...(head.length > 0 ? [head] : []), ...block.rows.map((row) => row.map(cellContent))],
    },
    layout: "lightHorizontalLines",
  };
}

/** The lettering has a tick, but no cross of its own: the multiplication sign serves. */
const MARKS = { met: "✓ ", notMet: "× ", unknown: "? " } as const;

function cellContent(cell: OutlineCell): TableCell {
  const number = cell.look === "number" || cell.look === "struck" || cell.look === "worse";
  return {
    stack: [
      {
        text: `${cell.mark === undefined ? "" : MARKS[cell.mark]}${cell.text}`,
        ...(number && { font: "Mono", fontSize: 7.6 }),
        ...(cell.look === "strong" && { bold: true }),
        ...(cell.look === "worse" && { color: RED }),
        ...(cell.look === "struck" && { decoration: "lineThrough" as const }),
      },
      ...(cell.sub === undefined || cell.sub === ""
        ? []
        : [{ text: cell.sub, font: "Cond", fontSize: 7.6, color: INK_2 }]),
    ],
  };
}
