import type { CircuitFile } from "../circuit/circuit-file";
import type { FileEdit } from "./file-edit";

/** The reference net, the block on top, and the ports of blocks: what is no part and moves voltages all the same. */
export function structureEdits(base: CircuitFile, proposed: CircuitFile): readonly FileEdit[] {
  const singles = (["reference", "top"] as const)
    .filter((key) => defaulted(base, key) !== defaulted(proposed, key))
    .map((key) =>
      structureEdit(key, base[key], proposed[key], (file) => {
        const { [key]: _, ...rest } = file;
        return proposed[key] === undefined ? rest : { ...rest, [key]: proposed[key] };
      }),
    );
  const ports = Object.keys(proposed.blocks).flatMap((block): readonly FileEdit[] => {
    const was = base.blocks[block]?.ports ?? [];
    const is = proposed.blocks[block]?.ports ?? [];
    if (JSON.stringify(was) === JSON.stringify(is)) return [];
    return [
      structureEdit(`${block} ports`, was, is, (file) => ({
        ...file,
        blocks: {
          ...file.blocks,
          [block]: { ...(file.blocks[block] ?? { parts: [] }), ports: is },
        },
      })),
    ];
  });
  return [...singles, ...ports];
}

/** What a file that leaves it out means. */
function defaulted(file: CircuitFile, key: "reference" | "top"): string | undefined {
  return file[key] ?? (key === "reference" ? "GND" : Object.keys(file.blocks)[0]);
}

function structureEdit(key: string, was: unknown, is: unknown, apply: FileEdit["apply"]): FileEdit {
  return {
    edit: {
      id: key,
      change: "value",
      key,
      ...(was !== undefined && { was }),
      ...(is !== undefined && { is }),
    },
    apply,
    electrical: true,
    judging: false,
  };
}
