import type { KeyboardEvent, PointerEvent, ReactNode } from "react";

interface DrawnButtonProps {
  readonly className: string;
  /** Read aloud. */
  readonly label: string;
  /** Whether Tab reaches it; else only arrow keys and the pointer do. */
  readonly reachable: boolean;
  readonly pressed?: boolean | undefined;
  readonly onAct: () => void;
  /** Other keys than Enter and Space. */
  readonly onOtherKey?: ((event: KeyboardEvent) => void) | undefined;
  readonly onFocus?: (() => void) | undefined;
  readonly onPointerDown?: ((event: PointerEvent<SVGGElement>) => void) | undefined;
  readonly transform?: string | undefined;
  /** Found again by this name. */
  readonly item?: string | undefined;
  readonly children: ReactNode;
}

/** A button drawn on the sheet. SVG has no element for one: a group is given the role, the keys and the name. */
export function DrawnButton(props: DrawnButtonProps) {
  const attributes = {
    role: "button",
    tabIndex: props.reachable ? 0 : -1,
    "aria-label": props.label,
    "aria-pressed": props.pressed,
    "data-item": props.item,
    className: props.className,
    transform: props.transform,
    onClick: (event: { stopPropagation: () => void }) => {
      event.stopPropagation();
      props.onAct();
    },
    onFocus: props.onFocus,
    onPointerDown: props.onPointerDown,
    onKeyDown: (event: KeyboardEvent) => {
      if (event.key !== "Enter" && event.key !== " ") props.onOtherKey?.(event);
      else {
        event.preventDefault();
        event.stopPropagation();
        props.onAct();
      }
    },
  };
  return <g {...attributes}>{props.children}</g>;
}
