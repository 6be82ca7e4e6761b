"use client";

import { useId } from "react";

/** One of a few words. */
export function ChoiceField(props: {
  readonly label: string;
  readonly value: string;
  readonly words: readonly string[];
  readonly disabled: boolean;
  readonly onChange: (value: string) => void;
}) {
  const id = useId();
  return (
    <div className="f">
      <dt>
        <label htmlFor={id}>{props.label}</label>
      </dt>
      <dd>
        <select
          id={id}
          value={props.value}
          disabled={props.disabled}
          onChange={(event) => props.onChange(event.target.value)}
        >
          {!props.words.includes(props.value) && <option value={props.value}>choose</option>}
          {props.words.map((word) => (
            <option key={word} value={word}>
              {word}
            </option>
          ))}
        </select>
      </dd>
    </div>
  );
}

/** Yes or no. */
export function FlagField(props: {
  readonly label: string;
  readonly value: boolean;
  readonly disabled: boolean;
  readonly onChange: (value: boolean) => void;
}) {
  const id = useId();
  return (
    <div className="f">
      <dt>
        <label htmlFor={id}>{props.label}</label>
      </dt>
      <dd>
        <input
          id={id}
          type="checkbox"
          checked={props.value}
          disabled={props.disabled}
          onChange={(event) => props.onChange(event.target.checked)}
        />
      </dd>
    </div>
  );
}
