import type { Law, Stage } from "./law";

/** Several laws in one part. `pins` are its pins' unknowns; the members' own unknowns follow. */
export function joinLaws(pins: readonly number[], members: readonly Law[]): Law {
  const inner = new Set(members.flatMap((member) => member.terminals).filter((one) => one !== 0));
  for (const pin of pins) inner.delete(pin);
  const terminals = [...pins, ...inner];
  const places = members.map((member) =>
    Int32Array.from(member.terminals, (unknown) => terminals.indexOf(unknown)),
  );
  const f = new Float64Array(terminals.length);
  const q = new Float64Array(terminals.length);
  const rows = members.flatMap((member) => [...member.rows]);
  const g = new Float64Array(rows.length);
  const c = new Float64Array(rows.length);
  const evaluate = (x: Float64Array, at: Stage): void => {
    f.fill(0);
    q.fill(0);
    let entry = 0;
    members.forEach((member, m) => {
      member.evaluate(x, at);
      g.set(member.g, entry);
      c.set(member.c, entry);
      entry += member.g.length;
      member.terminals.forEach((_, k) => {
        const place = places[m]?.[k] ?? -1;
        if (place < 0) return;
        f[place] = (f[place] ?? 0) + (member.f[k] ?? 0);
        q[place] = (q[place] ?? 0) + (member.q[k] ?? 0);
      });
    });
  };
  const columns = members.flatMap((member) => [...member.columns]);
  const paths = members.flatMap((member) => [...member.paths]);
  const linear = members.every((member) => member.linear);
  return { linear, terminals, rows, columns, f, q, g, c, evaluate, paths };
}
