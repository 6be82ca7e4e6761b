import type { Quantity } from "../values/quantity";
import type { Range } from "../values/range";
import type { Place } from "./place";

/** What conditions and limits may refer to. Each answer null is reported at the place it was asked for. */
export interface Addresses {
  /** Whether a net of this name takes part in the circuit. */
  net(place: Place, name: string): boolean;
  /** Whether a fitted part has this path. */
  part(place: Place, path: string): boolean;
  /** What a parameter, such as `V1.dc`, measures and may be. */
  parameter(place: Place, address: string): { quantity: Quantity; range: Range } | null;
  /** What a stored quantity, such as `C1.voltage` or `L1.current`, measures. */
  state(place: Place, address: string): Quantity | null;
}
