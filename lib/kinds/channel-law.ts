import type { JunctionCurrent } from "./junction-current";
import { emptyLaw, type Law, Places, type Site, type Stage } from "./law";

/** A channel's current for vds >= 0 (both counted as for an n channel) and its derivatives. */
export interface ChannelCurrent {
  current: number;
  byGate: number;
  byDrain: number;
}

/**
 * A field-effect transistor, symmetric: for vds < 0 drain and source change places. No direct
 * current flows into the gate.
 * @param sign 1 for an n channel, -1 for p
 * @param fill sets the channel's current and derivatives at vgs and vds >= 0
 * @param body the diode from source to drain (n channel), if any
 */
export function channelLaw(
  site: Site,
  sign: 1 | -1,
  fill: (vgs: number, vds: number, out: ChannelCurrent) => void,
  body: JunctionCurrent | null,
): Law {
  const [drain, gate, source] = [site.pin("drain"), site.pin("gate"), site.pin("source")];
  const pins = [drain, gate, source];
  const places = new Places();
  for (const row of [drain, source]) for (const column of pins) places.add(row, column);
  const law = emptyLaw(pins, places);
  const { f, g } = law;
  const out: ChannelCurrent = { current: 0, byGate: 0, byDrain: 0 };

  const evaluate = (x: Float64Array, at: Stage): void => {
    const vds = sign * ((x[drain] ?? 0) - (x[source] ?? 0));
    const vg = x[gate] ?? 0;
    let [i, byDrain, byGate] = [0, 0, 0];
    if (vds >= 0) {
      fill(sign * (vg - (x[source] ?? 0)), vds, out);
      [i, byDrain, byGate] = [out.current, out.byDrain, out.byGate];
    } else {
      fill(sign * (vg - (x[drain] ?? 0)), -vds, out);
      i = -out.current;
      byDrain = out.byGate + out.byDrain;
      byGate = -out.byGate;
    }
    i += at.helping * vds;
    byDrain += at.helping;
    if (body !== null) {
      body.follow(-vds, at);
      i -= body.current;
      byDrain += body.conductance;
    }
    f[0] = sign * i;
    f[2] = -sign * i;
    g[0] = byDrain;
    g[1] = byGate;
    g[2] = -byDrain - byGate;
    g[3] = -byDrain;
    g[4] = -byGate;
    g[5] = byDrain + byGate;
  };
  return { ...law, evaluate, paths: [{ from: drain, to: source, tie: "conducts" }] };
}
