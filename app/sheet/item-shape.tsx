import type { KeyboardEvent, PointerEvent, ReactNode } from "react";
import { grown } from "../../lib/sheet/box";
import { DrawnButton } from "./drawn-button";
import type { SheetItem } from "./sheet-items";
import { rectOf } from "./svg-path";

interface ItemShapeProps {
  readonly item: SheetItem;
  readonly picked: boolean;
  /** The one item of the sheet that Tab reaches. */
  readonly current: boolean;
  readonly onPick: () => void;
  readonly onFocus: () => void;
  readonly onKeyDown: (event: KeyboardEvent) => void;
  readonly onPointerDown?: ((event: PointerEvent<SVGGElement>) => void) | undefined;
  readonly offset?: readonly [number, number] | undefined;
  readonly children: ReactNode;
}

/** A part or net as something to reach and pick: one button, named for those who do not see it. */
export function ItemShape(props: ItemShapeProps) {
  const { item, offset } = props;
  const isPart = "part" in item.selection;
  return (
    <DrawnButton
      className={isPart ? "item part" : "item wire"}
      label={item.words}
      reachable={props.current}
      pressed={props.picked}
      item={item.key}
      transform={offset === undefined ? undefined : `translate(${offset[0]} ${offset[1]})`}
      onAct={props.onPick}
      onFocus={props.onFocus}
      onOtherKey={props.onKeyDown}
      onPointerDown={props.onPointerDown}
    >
      {isPart && <rect className="hit" {...rectOf(grown(item.box, 3))} />}
      {props.children}
    </DrawnButton>
  );
}
