import type { Circuit } from "../kinds/circuit";
import type { Part } from "../kinds/part";

/** What an unknown is: the voltage of a net, or something inside a part. `net` null: a private net. */
export type UnknownName =
  | { readonly net: string }
  | { readonly part: string; readonly pin: string | null };

/** The numbering of the unknowns. 0 is the reference; nets come first, then what parts ask for. */
export class Unknowns {
  readonly names: UnknownName[] = [{ net: "" }];
  /** Unknowns that are node voltages: they may be shunted while a solution is approached. */
  readonly nodes: number[] = [];
  private readonly byNet = new Map<string, number>();
  private readonly byPin = new Map<string, number>();

  constructor(circuit: Circuit) {
    this.byNet.set(circuit.reference, 0);
    this.names[0] = { net: circuit.reference };
    for (const net of circuit.nets) {
      if (this.byNet.has(net)) continue;
      this.byNet.set(net, this.names.length);
      this.nodes.push(this.names.length);
      this.names.push({ net });
    }
  }

  get count(): number {
    return this.names.length - 1;
  }

  ofNet(net: string): number {
    const unknown = this.byNet.get(net);
    if (unknown === undefined) throw new Error(`${net} is no net of the circuit`);
    return unknown;
  }

  /** The unknown of a part's pin; a `null` pin gets a private one. */
  ofPin(part: Part, pin: string): number {
    const net = part.pins[pin];
    if (net !== null && net !== undefined) return this.ofNet(net);
    const key = `${part.path}\n${pin}`;
    const known = this.byPin.get(key);
    if (known !== undefined) return known;
    const unknown = this.ofPart(part.path, pin);
    this.nodes.push(unknown);
    this.byPin.set(key, unknown);
    return unknown;
  }

  /** An unknown of a part's own. */
  ofPart(path: string, pin: string | null = null): number {
    this.names.push({ part: path, pin });
    return this.names.length - 1;
  }
}
