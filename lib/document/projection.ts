import type * as Y from "yjs";
import type { CircuitFile, FileBlock } from "../circuit/circuit-file";
import { membersOf, objectOf, textOf } from "./plain";
import { projectBlock } from "./project-block";
import { projectConditions, projectLimits } from "./project-judgement";
import { type BlockParts, partsOfBlocks } from "./project-parts";
import type { ProjectionProblem } from "./projection-problem";
import { topLevel } from "./shape";
import { isPolicy } from "./written";

/** A document as a circuit file, and what had to be repaired for it. */
export interface Projection {
  readonly file: CircuitFile;
  readonly problems: readonly ProjectionProblem[];
  /** The document's id of each part, by block and designator as the file has them: `block\nR1`. */
  readonly idOf: ReadonlyMap<string, string>;
}

/**
 * The circuit file of a document: the same state gives the same bytes. Never throws and never
 * writes, whatever the state; what a merge broke is repaired by rule and told.
 */
export function project(doc: Y.Doc): Projection {
  const design = membersOf(topLevel(doc, "design"));
  const reference = nonEmpty(textOf(design["reference"])) ?? "GND";
  const top = nonEmpty(textOf(design["top"])) ?? "main";
  const parts = partsOfBlocks(doc);
  const names = new Set([top, ...topLevel(doc, "blocks").keys(), ...parts.byBlock.keys()]);
  const problems: ProjectionProblem[] = [...parts.problems];
  const blocks: [string, FileBlock][] = [];
  for (const name of [...names].sort()) {
    const held: BlockParts = parts.byBlock.get(name) ?? [];
    const { block, problems: found } = projectBlock(doc, name, held, reference);
    problems.push(...found);
    blocks.push([name, block]);
  }
  const idOf = new Map(
    [...parts.byBlock].flatMap(([name, held]) =>
      held.map((part): [string, string] => [`${name}\n${part.designator}`, part.id]),
    ),
  );
  const designatorOf = new Map(
    [...parts.byBlock.values()].flat().map((part) => [part.id, part.designator]),
  );
  const conditions = projectConditions(doc, designatorOf);
  const limits = projectLimits(doc, designatorOf);
  const policy = topLevel(doc, "policy").get("choice");
  return {
    file: {
      ampersign: 1,
      title: textOf(design["title"]) ?? "",
      reference,
      top,
      blocks: Object.fromEntries(blocks),
      ...(conditions.length > 0 && { conditions }),
      ...(limits.length > 0 && { limits }),
      ...(isPolicy(policy) && { policy: objectOf(policy) ?? {} }),
    },
    problems,
    idOf,
  };
}

function nonEmpty(text: string | null): string | null {
  return text === null || text === "" ? null : text;
}
