/** For what is drawn for the eye alone, and said elsewhere. */
export const unspoken = { "aria-hidden": true } as const;
