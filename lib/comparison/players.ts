import type { ComparisonProblem } from "./comparison";
import type { FileEdit } from "./file-edit";

/** With more edits than this every subset cannot be solved: those that touch the same part are taken together. */
const MOST_PLAYERS = 8;

/** Edits that are made together. */
export type Player = readonly FileEdit[];

/** The edits one by one, or, where they are too many, in groups; and that it is so. */
export function playersOf(edits: readonly FileEdit[]): {
  readonly players: readonly Player[];
  readonly problems: readonly ComparisonProblem[];
} {
  if (edits.length <= MOST_PLAYERS) return { players: edits.map((edit) => [edit]), problems: [] };
  const groups = new Map<string, FileEdit[]>();
  // Those that move voltages first: what only judges is put together before them.
  const ordered = [
    ...edits.filter((edit) => edit.electrical),
    ...edits.filter((edit) => !edit.electrical),
  ];
  for (const edit of ordered) {
    const place = edit.edit.part ?? edit.edit.condition ?? edit.edit.id;
    groups.set(place, [...(groups.get(place) ?? []), edit]);
  }
  let players = [...groups.values()];
  while (players.length > MOST_PLAYERS) {
    const last = players.pop() ?? [];
    players = [...players.slice(0, -1), [...(players.at(-1) ?? []), ...last]];
  }
  return {
    players,
    problems: [
      {
        code: "editsGrouped",
        message: `${edits.length} edits are too many to combine one by one: they are taken in ${players.length} groups, and an edit's share is its group's share divided evenly.`,
      },
    ],
  };
}
