/** The middle one of the given times. */
function median(times: readonly number[]): number {
  const sorted = times.toSorted((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? Number.NaN;
}

/** Runs the given works in turn, several rounds, after a warm-up. @returns the median milliseconds of each */
export function interleaved(
  works: readonly (() => void)[],
  rounds: number,
  warmUpMs = 300,
): readonly number[] {
  const begun = performance.now();
  while (performance.now() - begun < warmUpMs) for (const work of works) work();
  const times = works.map((): number[] => []);
  for (let round = 0; round < rounds; round++)
    works.forEach((work, index) => {
      const start = performance.now();
      work();
      times[index]?.push(performance.now() - start);
    });
  return times.map(median);
}
