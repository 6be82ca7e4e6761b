"use client";

import { useId, useState } from "react";

/** One line of answer under a finding. */
export function RemarkForm(props: { readonly onRemark: (text: string) => void }) {
  const [text, setText] = useState("");
  const id = useId();
  return (
    <form
      className="remark"
      onSubmit={(event) => {
        event.preventDefault();
        const words = text.trim();
        if (words === "") return;
        props.onRemark(words);
        setText("");
      }}
    >
      <label className="sr" htmlFor={id}>
        Remark
      </label>
      <textarea
        id={id}
        rows={2}
        value={text}
        maxLength={4000}
        placeholder="Answer or add to this finding"
        onChange={(event) => setText(event.target.value)}
      />
      <button type="submit" className="btn" disabled={text.trim() === ""}>
        Add remark
      </button>
    </form>
  );
}
