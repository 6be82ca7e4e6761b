import type { Balloon, Cloud, Tag } from "../../lib/sheet/sheet-drawing";
import { Letters } from "./letters";
import { cloudPath, rectOf, through } from "./svg-path";

/** A cloud around what changed, with the triangle of its revision. */
export function CloudShape({ cloud }: { readonly cloud: Cloud }) {
  const [x, y] = cloud.triangle;
  return (
    <>
      <path className="cloud" d={cloudPath(cloud.box)} />
      <path className="tri" d={`M${x} ${y}L${x + 9.5} ${y + 16}H${x - 9.5}Z`} />
      <text className="trit" x={x} y={y + 13.6}>
        {cloud.letter}
      </text>
    </>
  );
}

/** A number at a net or part. Past a limit: thick box and a diamond, so that no colour is needed. `meets`: its line ends on a wire. */
export function TagShape({ tag, meets }: { readonly tag: Tag; readonly meets: boolean }) {
  const { level, box, letters, leader } = tag;
  const past = level === "past";
  return (
    <>
      {leader.length > 1 && <path className="ld" d={through(leader)} />}
      {meets && <MeetingDot at={leader.at(-1)} />}
      {box !== null && <rect className={past ? "vbox bad" : "vbox"} {...rectOf(box)} />}
      {box !== null && past && <PastMark x={box[0]} y={(box[1] + box[3]) / 2} />}
      <Letters letters={letters} />
    </>
  );
}

function MeetingDot({ at }: { readonly at: readonly [number, number] | undefined }) {
  return at === undefined ? null : <circle className="dot" cx={at[0]} cy={at[1]} r={2.1} />;
}

function PastMark({ x, y }: { readonly x: number; readonly y: number }) {
  return <path className="pastmark" d={`M${x} ${y - 4.5}l4.5 4.5l-4.5 4.5l-4.5 -4.5Z`} />;
}

/** Edge of a balloon: hexagon for major, circle for minor, square for an observation, diamond for a question. */
export function BalloonShape({
  balloon,
  open,
}: {
  readonly balloon: Balloon;
  readonly open: boolean;
}) {
  const { number, severity, at, leader } = balloon;
  const [x, y] = at;
  return (
    <>
      <path className="ld" d={through(leader)} />
      <BalloonEdge severity={severity} x={x} y={y} open={open} />
      <text className="bt" x={x} y={y + 3.8}>
        {number}
      </text>
    </>
  );
}

const EDGES: Readonly<Record<Exclude<Balloon["severity"], "minor">, string>> = {
  major: "M-5.2 -9.5H5.2L10.4 0L5.2 9.5H-5.2L-10.4 0Z",
  observation: "M-8.7 -8.7H8.7V8.7H-8.7Z",
  question: "M0 -11.4L11.4 0L0 11.4L-11.4 0Z",
};

interface EdgeProps {
  readonly severity: Balloon["severity"];
  readonly x: number;
  readonly y: number;
  readonly open: boolean;
}

function BalloonEdge({ severity, x, y, open }: EdgeProps) {
  const blue = severity === "observation" || severity === "question";
  const className = `bo${blue ? " q" : ""}${open ? " open" : ""}`;
  if (severity === "minor") return <circle className={className} cx={x} cy={y} r={9.5} />;
  return <path className={className} d={EDGES[severity]} transform={`translate(${x} ${y})`} />;
}
