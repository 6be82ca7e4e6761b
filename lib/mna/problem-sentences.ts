import type { SolveProblem, SolveProblemCode } from "./solution";

const MOST_NAMED = 8;
const NO_PARTS = "its parts";

const sentences: {
  readonly [Code in SolveProblemCode]: (nets: string, parts: string) => string;
} = {
  noPathToReference: (nets, parts) =>
    `Nothing holds ${nets} at a voltage: no direct current can flow between it and the reference. Give it a path beside ${parts}.`,
  sourcesFight: (nets, parts) =>
    `${parts} fix voltages around one loop at ${nets}. Put a resistance into the loop.`,
  currentHasNowhereToGo: (nets, parts) =>
    `The currents that ${parts} force into ${nets} have no way out. Give them a path for direct current.`,
  singular: (nets, parts) =>
    `The equations leave ${nets} undetermined. Look at ${parts}: a controlled source or an amplifier may work on nothing.`,
  noConvergence: (nets, parts) =>
    `No solution was found; ${nets} still moved at the end. Check the values around ${parts}, or say under "start" where to begin.`,
  notTrusted: (nets, parts) =>
    `A solution was found but does not hold its certificate near ${nets}. Look for extreme values at ${parts}.`,
  tooLarge: () => "The circuit or its analysis is larger than this engine takes. Divide it.",
  stepTooSmall: (nets, parts) =>
    `The course in time could not be followed: ${nets} changes faster than the smallest step. Look at ${parts}.`,
  notYetSolved: (_, parts) =>
    parts === NO_PARTS
      ? "The engine gives the operating point alone: frequency responses and spreads cannot be solved yet."
      : `The engine has no law yet for ${parts}; leave them out ("fitted": false) to solve the rest.`,
};

/** A problem row with its sentence. */
export function problem(
  code: SolveProblemCode,
  condition: string,
  nets: readonly string[],
  parts: readonly string[],
): SolveProblem {
  const message = sentences[code](listed(nets, "a net inside a part"), listed(parts, NO_PARTS));
  return { code, message, condition, nets, parts };
}

function listed(names: readonly string[], none: string): string {
  if (names.length === 0) return none;
  const named = names.slice(0, MOST_NAMED).join(", ");
  return names.length > MOST_NAMED ? `${named} and ${names.length - MOST_NAMED} more` : named;
}
