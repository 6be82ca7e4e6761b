/**
 * A factor by temperature, linear between the points, held before the first. After the last it is
 * zero, held, or not evaluated (null), as the rule says.
 */
export function piecewise(
  points: readonly (readonly [celsius: number, factor: number])[],
  beyond: "zero" | "notEvaluated" | "held",
  celsius: number,
): number | null {
  const first = points[0];
  const last = points[points.length - 1];
  if (first === undefined || last === undefined) return null;
  // A single point says a factor, not where it ends.
  if (points.length === 1 && beyond === "held") return first[1];
  if (celsius <= first[0]) return first[1];
  if (celsius > last[0]) return beyond === "zero" ? 0 : beyond === "held" ? last[1] : null;
  const upper = points.findIndex(([at]) => at >= celsius);
  const [toCelsius, toFactor] = points[upper] ?? last;
  const [fromCelsius, fromFactor] = points[upper - 1] ?? first;
  if (toCelsius === fromCelsius) return toFactor;
  return (
    fromFactor + ((toFactor - fromFactor) * (celsius - fromCelsius)) / (toCelsius - fromCelsius)
  );
}
