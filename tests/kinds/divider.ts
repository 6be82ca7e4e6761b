/** A small good file to bend: `divider({ limits: [...] })` replaces keys of the file. */
export function divider(replaced: Readonly<Record<string, unknown>> = {}): unknown {
  return { ...good, ...replaced };
}

/** The divider with other parts in its only block. */
export function withParts(...parts: readonly unknown[]): unknown {
  return divider({ blocks: { main: { parts } } });
}

export const source = {
  ref: "V1",
  kind: "voltageSource",
  pins: { plus: "IN", minus: "GND" },
  params: { dc: "24 V" },
};

export function resistor(
  ref: string,
  first: string | null,
  second: string | null,
  more: Readonly<Record<string, unknown>> = {},
): Readonly<Record<string, unknown>> {
  return {
    ref,
    kind: "resistor",
    pins: { "1": first, "2": second },
    params: { resistance: "4k7" },
    ...more,
  };
}

const good = {
  ampersign: 1,
  blocks: {
    main: { parts: [source, resistor("R1", "IN", "OUT"), resistor("R2", "OUT", "GND")] },
  },
};
