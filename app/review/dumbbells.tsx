/** The small pictures of the ledger: from was (open) to is (filled), drawn in bands or against a limit. */

const WAS_X = 50;
const BAND_PX = 30;
const LEFT = 4;
const RIGHT = 112;

/** A net's shift, its axis measured in tolerance bands: the band is always 30 px wide. */
export function ShiftDumbbell(props: {
  readonly was: number;
  readonly is: number;
  readonly band: readonly [low: number, high: number] | null;
  readonly limits: readonly [min: number | null, max: number | null] | null;
  readonly past: boolean;
}) {
  const { was, is, band, limits, past } = props;
  const width = band === null ? 0 : band[1] - band[0];
  const perVolt = width > 0 ? BAND_PX / width : Number.POSITIVE_INFINITY;
  const x = (volts: number): number => (volts === was ? WAS_X : WAS_X + (volts - was) * perVolt);
  const end = Math.min(Math.max(x(is), LEFT), RIGHT);
  const beyond = x(is) < LEFT ? "left" : x(is) > RIGHT ? "right" : null;
  return (
    <svg className="db" width="118" height="20" viewBox="0 0 118 20" aria-hidden="true">
      {band !== null && width > 0 && (
        <rect className="tol" x={x(band[0])} y="5" width={BAND_PX} height="10" />
      )}
      <line className="axis" x1="0" x2="118" y1="10" y2="10" />
      {bracket(limits?.[0] ?? null, x, 1)}
      {bracket(limits?.[1] ?? null, x, -1)}
      {is !== was && (
        <line className={past ? "link badlink" : "link"} x1={WAS_X} x2={end} y1="10" y2="10" />
      )}
      {is !== was && <circle className="was" cx={WAS_X} cy="10" r="3.4" />}
      <IsMark x={end} y={10} past={past} beyond={beyond} waived={false} />
    </svg>
  );
}

/** Applied over limit: the limit stands at 81.2, hatched beyond. */
export function StressDumbbell(props: {
  readonly wasRatio: number | null;
  readonly isRatio: number | null;
  readonly waived: boolean;
}) {
  const { wasRatio, isRatio, waived } = props;
  const x = (ratio: number): number => Math.min(6 + ratio * 75.2, 98);
  const past = isRatio !== null && isRatio > 1 && !waived;
  return (
    <svg className="db" width="102" height="20" viewBox="0 0 102 20" aria-hidden="true">
      <rect className="over" x="81.2" y="3" width="20.8" height="14" />
      <line className="axis" x1="6" x2="102" y1="10" y2="10" />
      <line className="lim" x1="81.2" x2="81.2" y1="1" y2="19" />
      {wasRatio !== null && isRatio !== null && (
        <line
          className={past ? "link badlink" : "link"}
          x1={x(wasRatio)}
          x2={x(isRatio)}
          y1="10"
          y2="10"
        />
      )}
      {wasRatio !== null && <circle className="was" cx={x(wasRatio)} cy="10" r="3.4" />}
      {isRatio !== null && (
        <IsMark x={x(isRatio)} y={10} past={past} beyond={null} waived={waived} />
      )}
    </svg>
  );
}

/** A figure within its limits: the brackets stand at 14 and 58. */
export function LimitDumbbell(props: {
  readonly was: number | null;
  readonly is: number | null;
  readonly min: number | null;
  readonly max: number | null;
  readonly past: boolean;
  readonly waived: boolean;
}) {
  const { was, is, min, max, past, waived } = props;
  const low = min ?? (max ?? 1) - Math.max(Math.abs(max ?? 1), 1e-12);
  const high = max ?? (min ?? 0) + Math.max(Math.abs(min ?? 1), 1e-12);
  const x = (value: number): number =>
    Math.min(Math.max(14 + ((value - low) / (high - low || 1)) * 44, 3), 78);
  return (
    <svg className="db" width="82" height="22" viewBox="0 0 82 22" aria-hidden="true">
      <line className="axis" x1="0" x2="82" y1="11" y2="11" />
      {min !== null && <path className="lim" d="M19 3H14V19H19" />}
      {max !== null && <path className="lim" d="M53 3H58V19H53" />}
      {was !== null && is !== null && (
        <line className={past ? "link badlink" : "link"} x1={x(was)} x2={x(is)} y1="11" y2="11" />
      )}
      {was !== null && <circle className="was" cx={x(was)} cy="11" r="3.4" />}
      {is !== null && <IsMark x={x(is)} y={11} past={past} beyond={null} waived={waived} />}
    </svg>
  );
}

function IsMark(props: {
  readonly x: number;
  readonly y: number;
  readonly past: boolean;
  readonly beyond: "left" | "right" | null;
  readonly waived: boolean;
}) {
  const { x, y, past, beyond, waived } = props;
  const kind = past ? "bad" : "is";
  if (beyond === "left") return <path className={kind} d={`M${x + 3} ${y - 5}l-7 5l7 5z`} />;
  if (beyond === "right") return <path className={kind} d={`M${x - 3} ${y - 5}l7 5l-7 5z`} />;
  if (past) return <path className="bad" d={`M${x} ${y - 5.5}l5.5 5.5l-5.5 5.5l-5.5 -5.5Z`} />;
  if (waived) return <rect className="is" x={x - 4} y={y - 4} width="8" height="8" />;
  return <circle className="is" cx={x} cy={y} r="3.8" />;
}

function bracket(volts: number | null, x: (volts: number) => number, inward: 1 | -1) {
  if (volts === null) return null;
  const at = x(volts);
  if (!(at >= 0 && at <= 118)) return null;
  return <path className="lim" d={`M${at + 4 * inward} 2H${at}V18H${at + 4 * inward}`} />;
}
