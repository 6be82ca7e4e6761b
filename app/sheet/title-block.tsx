import type { Box } from "../../lib/kinds/part-symbol";
import { CellText } from "./cell-text";
import { CriteriaBlock } from "./criteria-block";
import { SignOffBlock } from "./sign-off-block";
import { rectOf } from "./svg-path";
import type { TitleFacts } from "./title-facts";

interface TitleBlockProps {
  readonly box: Box;
  readonly facts: TitleFacts;
  readonly onSign?: (() => void) | undefined;
}

/** Lower right: exit criteria and sign-off above, the fields of ISO 7200 below. */
export function TitleBlock({ box, facts, onSign }: TitleBlockProps) {
  const [left, top, right, bottom] = box;
  const [first, second] = [bottom - 70, bottom - 34];
  const width = right - left;
  return (
    <g className="title">
      <rect className="tbo" {...rectOf(box)} />
      {facts.criteria !== undefined && (
        <>
          <CriteriaBlock criteria={facts.criteria} left={left} top={top} />
          <SignOffBlock
            lines={facts.signOff ?? []}
            box={[left + 237, top, right, first]}
            onSign={onSign}
          />
          <path className="tbl" d={`M${left} ${first}H${right}`} />
        </>
      )}
      <Cells
        y={first}
        height={36}
        left={left}
        cells={[
          { caption: "Legal owner", text: facts.owner, width: 134 },
          { caption: "Title", text: facts.title, width: 172, bold: true },
          { caption: "Document type", text: facts.documentType, width: width - 306 },
        ]}
      />
      <path className="tbl" d={`M${left} ${second}H${right}`} />
      <Cells
        y={second}
        height={34}
        left={left}
        cells={[
          { caption: "Creator", text: facts.creator, width: 112 },
          { caption: "Status", text: facts.status, width: 82 },
          { caption: "Number", text: facts.number, width: 56 },
          { caption: "Rev", text: facts.revision, width: 30, bold: true },
          { caption: facts.dated, text: facts.date, width: 68 },
          { caption: "Sheet", text: facts.sheet, width: width - 348 },
        ]}
      />
    </g>
  );
}

interface Cell {
  readonly caption: string;
  readonly text: string;
  readonly width: number;
  readonly bold?: boolean;
}

interface CellsProps {
  readonly left: number;
  readonly y: number;
  readonly height: number;
  readonly cells: readonly Cell[];
}

function Cells({ left, y, height, cells }: CellsProps) {
  return cells.map(({ caption, text, width, bold = false }, index) => {
    const x = left + cells.slice(0, index).reduce((sum, cell) => sum + cell.width, 0);
    return (
      <g key={caption}>
        {index > 0 && <path className="tbl" d={`M${x} ${y}v${height}`} />}
        <CellText look="tc" x={x + 6} y={y + 12} room={width - 8}>
          {caption}
        </CellText>
        <CellText look={bold ? "tb" : "tv"} x={x + 6} y={y + 28} room={width - 8}>
          {text}
        </CellText>
      </g>
    );
  });
}
