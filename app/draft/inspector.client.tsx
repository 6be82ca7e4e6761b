"use client";

import type { FilePart } from "../../lib/circuit/circuit-file";
import { catalogue, kinds } from "../../lib/kinds/catalogue";
import type { Parameter } from "../../lib/kinds/parameter";
import type { Kind } from "../../lib/kinds/part";
import type { Quantity } from "../../lib/values/quantity";
import { positive } from "../../lib/values/range";
import { kindWords } from "../wording/kinds";
import { parameterName } from "../wording/parameters";
import { ChoiceField, FlagField } from "./choice-field.client";
import { ValueField } from "./value-field.client";

/** What the inspector may do to the part it shows. */
export interface PartEdits {
  readonly setParameter: (name: string, value: string | boolean | null) => void;
  readonly setRating: (name: string, value: string | null) => void;
  readonly turn: () => void;
  readonly mirror: () => void;
  readonly remove: () => void;
}

/** The chosen part's values and ratings, each as written and as read. */
export function Inspector(props: {
  readonly part: FilePart;
  readonly zone: string;
  readonly disabled: boolean;
  readonly edits: PartEdits;
}) {
  const { part, disabled, edits } = props;
  const kind = kinds.find((one) => one === part.kind);
  return (
    <>
      <h2>
        <span className="num">{part.ref}</span>
        <span>{kind === undefined ? part.kind : kindWords[kind].name}</span>
        <span className="zone num">{props.zone}</span>
      </h2>
      <dl className="fields">
        {kind !== undefined &&
          parametersOf(kind).map(([name, parameter]) => (
            <ParameterField
              key={`${part.ref} ${name}`}
              name={name}
              parameter={parameter}
              part={part}
              disabled={disabled}
              onChange={(value) => edits.setParameter(name, value)}
            />
          ))}
        {Object.entries(part.ratings ?? {}).map(([name, written]) => (
          <ValueField
            key={`${part.ref} rated ${name}`}
            label={`Rated ${parameterName(name).toLowerCase()}`}
            written={String(written)}
            quantity={ratingQuantity(name)}
            range={positive}
            mayBeEmpty
            disabled={disabled}
            onChange={(value) => edits.setRating(name, value)}
          />
        ))}
      </dl>
      <div className="acts">
        <button type="button" className="btn" disabled={disabled} onClick={edits.turn}>
          Turn
        </button>
        <button type="button" className="btn" disabled={disabled} onClick={edits.mirror}>
          Mirror
        </button>
        <button type="button" className="btn" disabled={disabled} onClick={edits.remove}>
          Remove {part.ref}
        </button>
      </div>
    </>
  );
}

function ParameterField(props: {
  readonly name: string;
  readonly parameter: Parameter;
  readonly part: FilePart;
  readonly disabled: boolean;
  readonly onChange: (value: string | boolean | null) => void;
}) {
  const { name, parameter, part } = props;
  const written = part.params?.[name];
  const label = parameterName(name);
  switch (parameter.form) {
    case "quantity":
      return (
        <ValueField
          label={label}
          written={written === undefined || written === null ? "" : String(written)}
          quantity={parameter.quantity}
          range={parameter.range}
          mayBeEmpty={parameter.default !== undefined}
          disabled={props.disabled}
          onChange={props.onChange}
        />
      );
    case "flag":
      return (
        <FlagField
          label={label}
          value={written === undefined ? parameter.default : written === true}
          disabled={props.disabled}
          onChange={props.onChange}
        />
      );
    case "choice":
      return (
        <ChoiceField
          label={label}
          value={typeof written === "string" ? written : ""}
          words={parameter.words}
          disabled={props.disabled}
          onChange={props.onChange}
        />
      );
    case "waveform":
      return written === undefined || written === null ? null : (
        <div className="f">
          <dt>{label}</dt>
          <dd className="wide">{JSON.stringify(written)}</dd>
        </div>
      );
  }
}

function parametersOf(kind: Kind): readonly (readonly [string, Parameter])[] {
  return Object.entries<Parameter>(catalogue[kind].parameters);
}

/** Ratings are named after what they rate: the unit follows from the name's end. */
function ratingQuantity(name: string): Quantity {
  const lower = name.toLowerCase();
  if (lower.endsWith("voltage")) return "voltage";
  if (lower.endsWith("current")) return "current";
  if (lower.endsWith("temperature")) return "temperature";
  return "power";
}
