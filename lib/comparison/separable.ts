/**
 * Puts players together that cannot be told apart because some combinations have no value: pairs of
 * which every valueless subset holds exactly one are one player, and no more than is needed is put
 * together. Groups are bit masks; any union of groups has a value, as no player and all players must.
 */
export function separableGroups(
  players: number,
  hasValue: (subset: number) => boolean,
): readonly number[] {
  let groups = Array.from({ length: players }, (_, player) => 1 << player);
  for (;;) {
    const missing = unionsOf(groups).filter((subset) => !hasValue(subset));
    if (missing.length === 0 || groups.length <= 1) return groups;
    groups = withBestPairMerged(groups, missing);
  }
}

/** The pair whose merging leaves the fewest subsets without a value; the first of equals. */
function withBestPairMerged(groups: readonly number[], missing: readonly number[]): number[] {
  let best = { left: Number.POSITIVE_INFINITY, first: 0, second: 0 };
  for (const [k, first] of groups.entries())
    for (const second of groups.slice(k + 1)) {
      const pair = first | second;
      const left = missing.filter(
        (subset) => (subset & pair) === 0 || (subset & pair) === pair,
      ).length;
      if (left < best.left) best = { left, first, second };
    }
  return groups.flatMap((group) => {
    if (group === best.first) return [group | best.second];
    return group === best.second ? [] : [group];
  });
}

/** Every union of groups, the empty one too, by the number of its combination. */
export function unionsOf(groups: readonly number[]): readonly number[] {
  return Array.from({ length: 1 << groups.length }, (_, combination) =>
    groups.reduce(
      (union, group, index) => ((combination & (1 << index)) === 0 ? union : union | group),
      0,
    ),
  );
}
