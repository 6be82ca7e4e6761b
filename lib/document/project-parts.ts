import type * as Y from "yjs";
import { catalogue, kinds } from "../kinds/catalogue";
import { membersOf, numberOf, textOf } from "./plain";
import type { ProjectionProblem } from "./projection-problem";
import { entriesOf, topLevel } from "./shape";

/** A part of the document with the designator that it bears in the file. */
export interface DocumentPart {
  readonly id: string;
  readonly kind: string;
  readonly designator: string;
  readonly pins: readonly string[];
  readonly map: Y.Map<unknown>;
}

/** Elder first. */
export type BlockParts = readonly DocumentPart[];

interface Draft {
  readonly id: string;
  readonly block: string;
  readonly born: number;
  readonly kind: string;
  readonly wanted: string;
  readonly map: Y.Map<unknown>;
}

/*
 * [PP1] Parts come in the order of their birth; of one moment, by id.
 * [PP2] Of two parts with one designator the elder keeps it; the younger shows the next free number of its letters.
 * [PP3] What is no part (without block, kind or designator) is left out and told.
 */

/** All parts, by block. */
export function partsOfBlocks(doc: Y.Doc): {
  readonly byBlock: ReadonlyMap<string, BlockParts>;
  readonly problems: readonly ProjectionProblem[];
} {
  const problems: ProjectionProblem[] = [];
  const drafts: Draft[] = [];
  for (const [id, map] of entriesOf(topLevel(doc, "parts"))) {
    const block = textOf(map.get("block"));
    const kind = textOf(map.get("kind"));
    const wanted = textOf(map.get("designator"));
    if (block === null || kind === null || wanted === null || !isName(block)) {
      problems.push({
        code: "unreadable",
        block: block ?? "",
        message: `An entry among the parts (${id}) is no part; remove it or undo what made it.`,
      });
      continue;
    }
    drafts.push({ id, block, kind, wanted, map, born: numberOf(map.get("born")) ?? 0 });
  }
  drafts.sort((a, b) => a.born - b.born || (a.id < b.id ? -1 : 1));
  const byBlock = new Map<string, DocumentPart[]>();
  for (const block of new Set(drafts.map((draft) => draft.block))) {
    const members = drafts.filter((draft) => draft.block === block);
    const wanted = new Set(members.map((draft) => draft.wanted));
    const given = new Set<string>();
    const parts = members.map((draft): DocumentPart => {
      const usable = isDesignator(draft.wanted);
      const free = usable && !given.has(draft.wanted);
      const designator = free ? draft.wanted : nextFree(draft.wanted, given, wanted);
      given.add(designator);
      if (!free)
        problems.push({
          code: "designatorTwice",
          block,
          part: designator,
          message: usable
            ? `Two parts are called ${draft.wanted}; the younger counts as ${designator}. Give it a designator of its own.`
            : `“${draft.wanted}” cannot be a designator; the part counts as ${designator}. Give it another.`,
        });
      return { id: draft.id, kind: draft.kind, designator, pins: pinsOf(draft), map: draft.map };
    });
    byBlock.set(block, parts);
  }
  return { byBlock, problems };
}

function pinsOf(draft: Draft): readonly string[] {
  const kind = kinds.find((one) => one === draft.kind);
  const described = kind === undefined ? "any" : catalogue[kind].pins;
  if (described !== "any") return described;
  const own = draft.map.get("pins");
  const listed = Array.isArray(own)
    ? own.filter((pin) => typeof pin === "string" && isDesignator(pin))
    : Object.keys(membersOf(own));
  return listed.length > 0 ? [...new Set(listed)] : ["1"];
}

/** The next number of a designator's letters that nobody bears or wants. */
export function nextFree(
  designator: string,
  given: ReadonlySet<string>,
  wanted: ReadonlySet<string>,
): string {
  const letters = /^[A-Za-z]+/.exec(designator)?.[0] ?? "X";
  for (let number = 1; ; number++) {
    const candidate = `${letters}${number}`;
    if (!given.has(candidate) && !wanted.has(candidate)) return candidate;
  }
}

function isDesignator(text: string): boolean {
  return text !== "" && !/[/.\p{Cc}]/u.test(text);
}

function isName(text: string): boolean {
  return isDesignator(text);
}
