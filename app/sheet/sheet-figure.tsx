import type { KeyboardEvent } from "react";
import { BalloonButtons } from "./balloon-buttons";
import { CornerMarks, OthersBox } from "./corner-marks";
import { GroundsAndFlags } from "./grounds-and-flags";
import { ItemShape } from "./item-shape";
import { LooseLines, NetShape } from "./net-shape";
import { PartShape } from "./part-shape";
import { CloudShape, TagShape } from "./pencil-marks";
import { RevisionBlock } from "./revision-block";
import type { Selection } from "./selection";
import { itemKey, type SheetItem } from "./sheet-items";
import { SheetPaper } from "./sheet-paper";
import type { SheetProps } from "./sheet-props";
import { TitleBlock } from "./title-block";
import { unspoken } from "./unspoken";
import type { Moving } from "./use-move";

interface SheetFigureProps {
  readonly sheet: SheetProps;
  readonly items: readonly SheetItem[];
  /** The item that Tab reaches. */
  readonly current: string | null;
  readonly moving: Moving;
  readonly onVisit: (key: string) => void;
  readonly onItemKey: (item: SheetItem, event: KeyboardEvent) => void;
}

/** Everything drawn on the sheet, from the paper up to the marks over it. */
export function SheetFigure(props: SheetFigureProps) {
  const { sheet, items, moving } = props;
  const { drawing, selection } = sheet;
  const picked = selection === null ? null : itemKey(selection);
  const boxOf = (wanted: Selection) => items.find(({ key }) => key === itemKey(wanted))?.box;
  const pickedBox = selection === null ? undefined : boxOf(selection);
  return (
    <>
      <SheetPaper drawing={drawing} />
      <LooseLines drawing={drawing} />
      <GroundsAndFlags drawing={drawing} />
      {items.map((item) => (
        <ItemShape
          key={item.key}
          item={item}
          picked={item.key === picked}
          current={item.key === props.current}
          offset={
            moving.carried !== null && item.key === `part ${moving.carried.part}`
              ? moving.carried.by
              : undefined
          }
          onPick={() => sheet.onSelect?.(item.selection)}
          onFocus={() => props.onVisit(item.key)}
          onKeyDown={(event) => props.onItemKey(item, event)}
          onPointerDown={(event) => {
            const part = partOf(sheet, item);
            const svg =
              event.currentTarget instanceof SVGElement
                ? event.currentTarget.ownerSVGElement
                : null;
            if (part !== undefined && svg !== null && event.button === 0)
              moving.take(part, svg, event);
          }}
        >
          <ItemDrawing sheet={sheet} item={item} />
        </ItemShape>
      ))}
      {drawing.parts.map((part) => part.removed && <PartShape key={part.ref} part={part} />)}
      {drawing.clouds.map((cloud) => (
        <g key={cloud.parts.join()} {...unspoken}>
          <CloudShape cloud={cloud} />
        </g>
      ))}
      {drawing.partTags.map((tag) => (
        <g key={`${tag.part} ${tag.leader.join()}`} {...unspoken}>
          <TagShape tag={tag} meets={false} />
        </g>
      ))}
      <BalloonButtons
        balloons={drawing.balloons}
        open={sheet.openFinding ?? null}
        onOpen={sheet.onOpenFinding}
      />
      {sheet.title !== undefined && (
        <TitleBlock box={drawing.titleBlock} facts={sheet.title} onSign={sheet.onSign} />
      )}
      {drawing.revisionBlock !== null && sheet.revisions !== undefined && (
        <RevisionBlock box={drawing.revisionBlock} rows={sheet.revisions} />
      )}
      {sheet.others?.map((presence) => {
        const box = boxOf(presence.selection);
        return (
          box && (
            <OthersBox
              key={`${presence.initials} ${presence.name}`}
              box={box}
              presence={presence}
            />
          )
        );
      })}
      {pickedBox !== undefined && <CornerMarks box={pickedBox} />}
    </>
  );
}

function ItemDrawing({ sheet, item }: { readonly sheet: SheetProps; readonly item: SheetItem }) {
  const { drawing } = sheet;
  const part = partOf(sheet, item);
  if (part !== undefined) return <PartShape part={part} />;
  if (!("net" in item.selection)) return null;
  const { net: name } = item.selection;
  const net = drawing.nets.find((one) => one.net === name);
  if (net === undefined) return null;
  return (
    <NetShape
      net={net}
      wires={drawing.wires.filter((wire) => wire.net === name && !wire.removed)}
    />
  );
}

function partOf({ drawing }: SheetProps, { selection }: SheetItem) {
  if (!("part" in selection)) return undefined;
  return drawing.parts.find(({ ref, removed }) => ref === selection.part && !removed);
}
