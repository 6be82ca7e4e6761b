/** A digest in groups of eight, without its `sha256:`, as a person compares it on paper. */
export function digestGroups(digest: string): string {
  return (digest.replace("sha256:", "").match(/.{1,8}/g) ?? []).join(" ");
}
