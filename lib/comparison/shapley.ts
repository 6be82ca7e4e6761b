/**
 * The fair shares of players in a value (Shapley 1953): each player's marginal contribution, averaged
 * over all orders of joining. `value` is asked once for every subset, given as a bit mask. The shares
 * add up to value(all) - value(none).
 */
export function shapleyShares(
  players: number,
  value: (subset: number) => number,
): readonly number[] {
  const weights = Array.from({ length: players }, (_, size) => weightOf(size, players));
  const shares = new Array<number>(players).fill(0);
  for (let subset = 0; subset < 1 << players; subset++) {
    const without = value(subset);
    const weight = weights[countBits(subset)] ?? 0;
    for (let player = 0; player < players; player++) {
      if ((subset & (1 << player)) !== 0) continue;
      const gain = value(subset | (1 << player)) - without;
      shares[player] = (shares[player] ?? 0) + weight * gain;
    }
  }
  return shares;
}

/** |S|! (n - |S| - 1)! / n! */
function weightOf(size: number, players: number): number {
  let weight = 1 / players;
  // 1 / (n C(n - 1, |S|))
  for (let k = 1; k <= size; k++) weight *= k / (players - k);
  return weight;
}

function countBits(mask: number): number {
  let bits = 0;
  for (let rest = mask; rest !== 0; rest &= rest - 1) bits += 1;
  return bits;
}
