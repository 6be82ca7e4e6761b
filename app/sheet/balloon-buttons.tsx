import type { Balloon } from "../../lib/sheet/sheet-drawing";
import { DrawnButton } from "./drawn-button";
import { BalloonShape } from "./pencil-marks";

interface BalloonButtonsProps {
  readonly balloons: readonly Balloon[];
  readonly open: string | null;
  readonly onOpen?: ((finding: string) => void) | undefined;
}

/** The balloons of the findings; each opens the note with its number. */
export function BalloonButtons({ balloons, open, onOpen }: BalloonButtonsProps) {
  return balloons.map((balloon) => {
    const { id, number, severity, zone } = balloon;
    return (
      <DrawnButton
        key={id}
        className="balloonbutton"
        label={`Finding ${number}, ${severity}, zone ${zone}`}
        reachable
        pressed={id === open}
        onAct={() => onOpen?.(id)}
      >
        <BalloonShape balloon={balloon} open={id === open} />
      </DrawnButton>
    );
  });
}
