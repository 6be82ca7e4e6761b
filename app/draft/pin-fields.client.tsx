"use client";

import { useId, useState } from "react";
import type { FilePart } from "../../lib/circuit/circuit-file";
import type { DrawnPart } from "../../lib/sheet/sheet-drawing";
import type { DraftEdits } from "./draft-edits";

/** The pins of the chosen part with their nets: a pin is joined to a net by name here, or by a wire on the sheet. */
export function PinFields(props: {
  readonly part: FilePart;
  readonly drawn: DrawnPart | undefined;
  readonly reference: string;
  readonly disabled: boolean;
  readonly edits: DraftEdits;
}) {
  const { part, drawn, disabled, edits } = props;
  return (
    <dl className="fields pins">
      {Object.entries(part.pins ?? {}).map(([pin, net]) => (
        <PinField
          key={`${part.ref} ${pin}`}
          pin={pin}
          net={net}
          disabled={disabled}
          onName={(name) =>
            edits.nameNet(
              part.ref,
              pin,
              name,
              drawn?.pins.find((one) => one.name === pin)?.at ?? [0, 0],
            )
          }
          onDisconnect={() => edits.disconnect(part.ref, pin)}
        />
      ))}
    </dl>
  );
}

function PinField(props: {
  readonly pin: string;
  readonly net: string | null;
  readonly disabled: boolean;
  readonly onName: (net: string) => void;
  readonly onDisconnect: () => void;
}) {
  const { pin, net } = props;
  const [name, setName] = useState("");
  const id = useId();
  return (
    <div className="f">
      <dt>
        <label htmlFor={id}>Pin {pin}</label>
      </dt>
      <dd>
        {net === null ? (
          <input
            id={id}
            value={name}
            disabled={props.disabled}
            placeholder="net"
            onChange={(event) => setName(event.target.value)}
            onKeyDown={(event) => {
              const wanted = name.trim();
              if (event.key !== "Enter" || wanted === "" || /[/.]/.test(wanted)) return;
              props.onName(wanted);
              setName("");
            }}
          />
        ) : (
          <output id={id} className="num">
            {net}
          </output>
        )}
        {net !== null && !props.disabled && (
          <button type="button" className="btn quiet" onClick={props.onDisconnect}>
            disconnect
          </button>
        )}
      </dd>
    </div>
  );
}
