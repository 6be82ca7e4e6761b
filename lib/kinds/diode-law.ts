import { junctionAt } from "./junction-current";
import { emptyLaw, type Law, Places, type Site, type Stage } from "./law";
import type { Junction, Part } from "./part";

/** Shockley's law with breakdown, series resistance, constant junction capacitance and diffusion charge. */
export function diode(part: Part<"diode" | "zener" | "led" | "schottky">, site: Site): Law {
  return part.params.seriesResistance === 0
    ? bare(part.params, site)
    : behindResistance(part.params, site);
}

function bare(params: Junction, site: Site): Law {
  const [anode, cathode] = [site.pin("anode"), site.pin("cathode")];
  const places = new Places();
  for (const row of [anode, cathode])
    for (const column of [anode, cathode]) places.add(row, column);
  const law = emptyLaw([anode, cathode], places);
  const { f, q, g, c } = law;
  const junction = junctionAt(params, site.temperature);
  const evaluate = (x: Float64Array, at: Stage): void => {
    const v = (x[anode] ?? 0) - (x[cathode] ?? 0);
    junction.follow(v, at);
    f[0] = junction.current;
    f[1] = -junction.current;
    q[0] = params.junctionCapacitance * v + params.transitTime * junction.current;
    q[1] = -q[0];
    const capacitance = params.junctionCapacitance + params.transitTime * junction.conductance;
    for (let k = 0; k < 4; k++) {
      const sign = k === 0 || k === 3 ? 1 : -1;
      g[k] = sign * junction.conductance;
      c[k] = sign * capacitance;
    }
  };
  return { ...law, evaluate, paths: [{ from: anode, to: cathode, tie: "conducts" }] };
}

/** The current and the junction's own voltage as unknowns, so that a few milliohms lose no digits. */
function behindResistance(params: Junction, site: Site): Law {
  const [anode, cathode] = [site.pin("anode"), site.pin("cathode")];
  const [current, inner] = [site.current(), site.inner()];
  const places = new Places();
  places.add(anode, current);
  places.add(cathode, current);
  for (const column of [anode, cathode, current, inner]) places.add(current, column);
  places.add(inner, current);
  places.add(inner, inner);
  const law = emptyLaw([anode, cathode, current, inner], places);
  const { f, q, g, c } = law;
  g.set([1, -1, 1, -1, -params.seriesResistance, -1, -1, 0]);
  const junction = junctionAt(params, site.temperature);
  const evaluate = (x: Float64Array, at: Stage): void => {
    const i = x[current] ?? 0;
    const v = x[inner] ?? 0;
    junction.follow(v, at);
    f[0] = i;
    f[1] = -i;
    f[2] = (x[anode] ?? 0) - (x[cathode] ?? 0) - params.seriesResistance * i - v;
    f[3] = junction.current - i;
    q[3] = params.junctionCapacitance * v + params.transitTime * junction.current;
    g[7] = junction.conductance;
    c[7] = params.junctionCapacitance + params.transitTime * junction.conductance;
  };
  return { ...law, evaluate, paths: [{ from: anode, to: cathode, tie: "conducts" }] };
}
