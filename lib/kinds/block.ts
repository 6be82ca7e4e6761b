import type { Point } from "../circuit/drawing";
import type { Place } from "../circuit/place";
import type { ParameterValue } from "./parameter";
import type { Kind } from "./part";

/** A part as its block gives it: nets and paths are local to the block. */
export interface BlockPart {
  readonly entry: "part";
  readonly ref: string;
  readonly kind: Kind;
  readonly place: Place;
  readonly pins: ReadonlyMap<string, string | null>;
  /** Every parameter of the kind, defaults filled in. */
  readonly parameters: ReadonlyMap<string, ParameterValue>;
  /** The half-widths that the file states, by the parameter they serve. */
  readonly statedTolerances: ReadonlyMap<string, number>;
  readonly control: string | null;
  readonly of: readonly [string, string] | null;
  readonly ratings: ReadonlyMap<string, number>;
  readonly junctionToAmbient: number | null;
  readonly style: string | null;
  readonly drift: { readonly bias: number; readonly random: number } | null;
  readonly temperature: number | null;
  readonly fitted: boolean;
  readonly id: string | null;
  readonly note: string | null;
  readonly at: Point | null;
}

/** A use of another block. */
export interface BlockUse {
  readonly entry: "use";
  readonly ref: string;
  readonly place: Place;
  readonly block: string;
  readonly pins: ReadonlyMap<string, string | null>;
  readonly fitted: boolean;
}

/** A part that could not be read; what refers to it is not at fault. */
interface BrokenPart {
  readonly entry: "broken";
  readonly ref: string;
  readonly pins: ReadonlyMap<string, string | null>;
  /** Whether these are all its pins. */
  readonly clear: boolean;
}

export type BlockEntry = BlockPart | BlockUse | BrokenPart;

/** A block of the file, before it is put into the blocks that use it. */
export interface Block {
  readonly name: string;
  readonly place: Place;
  readonly ports: ReadonlySet<string>;
  /** By reference designator, in file order. */
  readonly entries: ReadonlyMap<string, BlockEntry>;
  /** Whether every net of the block could be made out. */
  readonly clear: boolean;
}

export type Blocks = ReadonlyMap<string, Block>;

/** What a path downward from a block leads to. */
export type Found =
  | { readonly entry: BlockPart | BlockUse; readonly fitted: boolean }
  /** It passes through something that could not be read. */
  | "unclear"
  | null;

/** Follows `X1/X2/R1` downward from a block. */
export function findEntry(blocks: Blocks, from: Block, path: string): Found {
  let block: Block | undefined = from;
  let fitted = true;
  const refs = path.split("/");
  for (const [index, ref] of refs.entries()) {
    if (block === undefined) return "unclear";
    const entry: BlockEntry | undefined = block.entries.get(ref);
    if (entry === undefined) return null;
    if (entry.entry === "broken") return "unclear";
    fitted &&= entry.fitted;
    if (index === refs.length - 1) return { entry, fitted };
    if (entry.entry === "part") return null;
    block = blocks.get(entry.block);
  }
  return null;
}
