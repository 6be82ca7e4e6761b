import type { DrawnPart, DrawnPin } from "../../lib/sheet/sheet-drawing";
import { DrawnButton } from "./drawn-button";
import { sheetPoint } from "./sheet-point";
import type { Wiring } from "./use-wiring";

interface PinHandlesProps {
  readonly parts: readonly DrawnPart[];
  /** The part whose pins Tab reaches. */
  readonly picked: string | null;
  readonly wiring: Wiring;
}

/** The pins of a draft: a wire is drawn from one to another, by pointer or with Enter at both. */
export function PinHandles({ parts, picked, wiring }: PinHandlesProps) {
  return parts
    .filter(({ removed }) => !removed)
    .flatMap(({ ref, pins }) =>
      pins.map((pin) => (
        <PinHandle
          key={`${ref} ${pin.name}`}
          part={ref}
          pin={pin}
          reachable={picked === ref}
          wiring={wiring}
        />
      )),
    );
}

interface PinHandleProps {
  readonly part: string;
  readonly pin: DrawnPin;
  readonly reachable: boolean;
  readonly wiring: Wiring;
}

function PinHandle({ part, pin, reachable, wiring }: PinHandleProps) {
  const { name, at, net } = pin;
  const from = wiring.open?.from;
  const begun = from?.part === part && from.pin === name;
  const where = net === null ? "not connected" : `net ${net}`;
  return (
    <DrawnButton
      className={begun ? "pinhandle begun" : "pinhandle"}
      label={`Pin ${name} of ${part}, ${where}: ${from === undefined ? "begin" : "end"} a wire here`}
      reachable={reachable}
      // By pointer a wire is drawn, not clicked: only a key comes here without one.
      onAct={() => wiring.open?.to ?? wiring.pick({ part, pin: name }, at)}
      onPointerDown={(event) => {
        event.stopPropagation();
        const svg = event.currentTarget.ownerSVGElement;
        if (svg === null) return;
        svg.setPointerCapture(event.pointerId);
        wiring.begin({ part, pin: name }, at, sheetPoint(svg, event.clientX, event.clientY));
      }}
    >
      <circle cx={at[0]} cy={at[1]} r={5} />
    </DrawnButton>
  );
}
