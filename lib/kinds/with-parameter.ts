import type { Kind, Part } from "./part";

/** The part with one numeric parameter (or its own temperature, degrees Celsius) at another value. */
export function withParameter<K extends Kind>(part: Part<K>, name: string, value: number): Part<K> {
  if (name === "temperature") return { ...part, temperature: value };
  return { ...part, params: { ...part.params, [name]: value } };
}
