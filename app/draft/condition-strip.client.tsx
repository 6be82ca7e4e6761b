"use client";

import type { CircuitResult } from "../../lib/stress/circuit-result";
import { LimitDumbbell } from "../review/dumbbells";
import { netLimit } from "../review/net-rows";
import { voltageWords } from "../wording/numbers";

/** One net in every condition: before the last edit (open) and now (filled); brackets are limits. */
export function ConditionStrip(props: {
  readonly net: string;
  readonly result: CircuitResult;
  readonly before: CircuitResult | null;
}) {
  const { net, result, before } = props;
  return (
    <section className="strip" aria-label="Selected net in every condition">
      <h2>
        <span>Net {net} in every condition</span>
        <span className="dim">before this edit and now; brackets are limits</span>
      </h2>
      <div
        className="vcs"
        style={{ gridTemplateColumns: `repeat(${result.conditions.length}, minmax(0, 1fr))` }}
      >
        {result.conditions.map((condition) => {
          const is = condition.nets[net] ?? null;
          const was =
            before?.conditions.find((one) => one.name === condition.name)?.nets[net] ?? null;
          const limit = netLimit(result, net, condition.name);
          const past = limit?.verdict === "fail";
          const moved = was !== null && is !== null && Math.abs(was - is) > 1e-6;
          return (
            <div className={past ? "vc worse" : "vc"} key={condition.name}>
              <p>
                <b>{condition.name}</b>
                <span className="num">
                  {moved && <span className="struck">{voltageWords(was)}</span>}{" "}
                  <span>{voltageWords(is)} V</span>
                </span>
              </p>
              <LimitDumbbell
                was={moved ? was : null}
                is={is}
                min={limit?.min ?? null}
                max={limit?.max ?? null}
                past={past}
                waived={false}
              />
            </div>
          );
        })}
      </div>
    </section>
  );
}
