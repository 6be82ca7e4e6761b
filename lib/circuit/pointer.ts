/** The JSON Pointer of a member below another (RFC 6901: `~` is written `~0` and `/` is written `~1`). */
export function below(pointer: string, key: string | number): string {
  const step = String(key);
  const plain = !step.includes("~") && !step.includes("/");
  return `${pointer}/${plain ? step : step.replaceAll("~", "~0").replaceAll("/", "~1")}`;
}
