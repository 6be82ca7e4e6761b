import { scaleLinear } from "d3-scale";
import { voltageWords } from "../wording/numbers";
import type { NetRow } from "./net-rows";

const WIDTH = 260;

/** A net's was and is on a scale in volts, with its band (bar) and its limits (brackets). */
export function WasIsScale(props: { readonly row: NetRow }) {
  const { was, is, band, limits, past } = props.row;
  if (is === null) return <p className="dim">Not determined in this condition.</p>;
  const marks = [was, is, band?.[0], band?.[1], limits?.[0], limits?.[1]].filter(
    (value): value is number => typeof value === "number" && Number.isFinite(value),
  );
  const low = Math.min(...marks);
  const high = Math.max(...marks);
  const room = Math.max((high - low) * 0.18, Math.abs(high) * 1e-4, 1e-6);
  const x = scaleLinear()
    .domain([low - room, high + room])
    .range([4, WIDTH - 4]);
  const tick = x.tickFormat(4);
  const moved = was !== null && was !== is;
  return (
    <svg
      viewBox={`0 0 ${WIDTH} 70`}
      role="img"
      aria-label={`was ${voltageWords(was)} V, is ${voltageWords(is)} V`}
    >
      {band !== null && (
        <rect
          x={x(band[0])}
          y="22"
          width={Math.max(x(band[1]) - x(band[0]), 1)}
          height="16"
          fill="var(--band)"
        />
      )}
      <line x1="0" x2={WIDTH} y1="30" y2="30" stroke="var(--rule)" />
      {x.ticks(4).map((value) => (
        <g key={value}>
          <path d={`M${x(value)} 46v5`} stroke="var(--rule)" />
          <text x={x(value)} y="63" className="st">
            {tick(value)}
          </text>
        </g>
      ))}
      {typeof limits?.[0] === "number" && <Bracket x={x(limits[0])} inward={6} />}
      {typeof limits?.[1] === "number" && <Bracket x={x(limits[1])} inward={-6} />}
      {moved && (
        <>
          <line
            x1={x(was)}
            x2={x(is)}
            y1="30"
            y2="30"
            stroke={past ? "var(--red)" : "var(--ink)"}
            strokeWidth="2.4"
          />
          <circle
            cx={x(was)}
            cy="30"
            r="4.5"
            fill="var(--sheet)"
            stroke="var(--ink)"
            strokeWidth="1.8"
          />
          <text x={x(was)} y="11" className="st ink" textAnchor={x(was) > x(is) ? "start" : "end"}>
            {voltageWords(was)}
          </text>
        </>
      )}
      {past ? (
        <path d={`M${x(is)} 23l7 7l-7 7l-7 -7z`} fill="var(--red)" />
      ) : (
        <circle cx={x(is)} cy="30" r="4.5" fill="var(--ink)" />
      )}
      <text
        x={x(is)}
        y="11"
        className={past ? "st red" : "st ink"}
        textAnchor={was !== null && x(was) > x(is) ? "end" : "start"}
      >
        {voltageWords(is)}
      </text>
    </svg>
  );
}

function Bracket(props: { readonly x: number; readonly inward: number }) {
  const { x, inward } = props;
  return (
    <path
      d={`M${x + inward} 14H${x}V46H${x + inward}`}
      fill="none"
      stroke="var(--ink)"
      strokeWidth="1.8"
    />
  );
}
