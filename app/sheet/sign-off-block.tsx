import type { Box } from "../../lib/kinds/part-symbol";
import { CellText } from "./cell-text";
import { DrawnButton } from "./drawn-button";
import { rectOf } from "./svg-path";
import type { SignOffLine } from "./title-facts";

interface SignOffBlockProps {
  readonly lines: readonly SignOffLine[];
  readonly box: Box;
  readonly onSign?: (() => void) | undefined;
}

/** Who authored, reviewed and approved; a tick and a date where it is signed. */
export function SignOffBlock({ lines, box, onSign }: SignOffBlockProps) {
  const [left, top, right, bottom] = box;
  const row = (bottom - top - 18) / Math.max(1, lines.length);
  return (
    <g>
      <path className="tbl" d={`M${left} ${top}V${bottom}`} />
      <CellText look="tc" x={left + 6} y={top + 12} room={130}>
        SIGN-OFF
      </CellText>
      {lines.map((line, index) => {
        const y = top + 18 + row * index;
        return (
          <g key={line.meaning}>
            {index > 0 && <path className="tbl" d={`M${left} ${y}H${right}`} />}
            <CellText look="tc" x={left + 6} y={y + 12} room={60}>
              {line.meaning}
            </CellText>
            <CellText look="tv" x={left + 6} y={y + 26.5} room={64}>
              {line.name}
            </CellText>
            <SignedOn line={line} right={right} y={y} onSign={onSign} />
          </g>
        );
      })}
    </g>
  );
}

interface SignedOnProps {
  readonly line: SignOffLine;
  readonly right: number;
  readonly y: number;
  readonly onSign?: (() => void) | undefined;
}

function SignedOn({ line, right, y, onSign }: SignedOnProps) {
  if (line.signedOn !== null) {
    return (
      <>
        <path className="yes" d={`M${right - 84} ${y + 9}l3 3.6l5.4 -7.6`}>
          <title>signed</title>
        </path>
        <CellText look="tm" x={right - 6} y={y + 26} room={70} anchor="end">
          {line.signedOn}
        </CellText>
      </>
    );
  }
  if (!line.mine || onSign === undefined) {
    return (
      <CellText look="tc" x={right - 6} y={y + 26} room={70} anchor="end">
        {line.waits}
      </CellText>
    );
  }
  return (
    <DrawnButton
      className="sign"
      label={`Sign: ${line.meaning.toLowerCase()}`}
      reachable
      onAct={onSign}
    >
      <rect {...rectOf([right - 76, y + 9, right - 6, y + 26])} />
      <text x={right - 41} y={y + 21}>
        Sign …
      </text>
    </DrawnButton>
  );
}
