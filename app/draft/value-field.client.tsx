"use client";

import { useEffect, useId, useState } from "react";
import { formatQuantity } from "../../lib/values/format-quantity";
import { type Quantity, quantities } from "../../lib/values/quantity";
import { type Range, rangeInWords, within } from "../../lib/values/range";
import { readValue } from "../../lib/values/read-value";

/**
 * A value as an engineer types it. It shows what was understood while one types; a wrong text is marked
 * in place and never replaces the old value.
 */
export function ValueField(props: {
  readonly label: string;
  readonly written: string;
  readonly quantity: Quantity;
  readonly range: Range;
  /** An empty field means "none" or the default. */
  readonly mayBeEmpty: boolean;
  readonly disabled: boolean;
  readonly onChange: (written: string | null) => void;
}) {
  const { written, quantity, range } = props;
  const [text, setText] = useState(written);
  const id = useId();
  // Another person's edit of the same value, or an undo, replaces what stands in the field.
  useEffect(() => setText(written), [written]);
  const reading = readingOf(text, quantity, range, props.mayBeEmpty);
  const commit = (): void => {
    if (text === written || reading.wrong) return;
    props.onChange(text.trim() === "" ? null : text.trim());
  };
  return (
    <div className="f">
      <dt>
        <label htmlFor={id}>{props.label}</label>
      </dt>
      <dd>
        <input
          id={id}
          value={text}
          disabled={props.disabled}
          aria-invalid={reading.wrong}
          aria-describedby={`${id}-reads`}
          autoComplete="off"
          spellCheck={false}
          onChange={(event) => setText(event.target.value)}
          onBlur={commit}
          onKeyDown={(event) => {
            if (event.key === "Enter") commit();
            if (event.key === "Escape") setText(written);
          }}
        />
        <span className={reading.wrong ? "reads worse" : "reads"} id={`${id}-reads`}>
          {reading.words}
        </span>
      </dd>
    </div>
  );
}

interface Reading {
  readonly words: string;
  readonly wrong: boolean;
}

function readingOf(text: string, quantity: Quantity, range: Range, mayBeEmpty: boolean): Reading {
  if (text.trim() === "") {
    return mayBeEmpty
      ? { words: "default", wrong: false }
      : { words: "needs a value", wrong: true };
  }
  const read = readValue(text, quantity);
  if (!read.ok) return { words: read.error.message, wrong: true };
  if (!within(range, read.value.value))
    return { words: `must be ${rangeInWords(range)}`, wrong: true };
  const unit = Object.keys(quantities[quantity].units)[0] ?? "";
  return { words: `reads ${spoken(read.value.value, quantity, unit)}`, wrong: false };
}

/** Fractions are spoken in per cent, everything else in its own unit. */
function spoken(value: number, quantity: Quantity, unit: string): string {
  if (quantity === "fraction") return `${Number((value * 100).toPrecision(6))} %`;
  if (quantity === "perKelvin") return `${Number((value * 1e6).toPrecision(6))} ppm/K`;
  return formatQuantity(value, unit);
}
