/** Said wherever a result could be relied on to keep people safe. */
export const cautions: readonly string[] = [
  "Computed from the models and ratings entered. Not a substitute for measurement.",
  "Local codes, applicable standards and licensed practice decide.",
  "Mains, batteries, heat and high voltage can injure or kill: fuse and wire sizes, insulation and guarding are outside this review.",
];
