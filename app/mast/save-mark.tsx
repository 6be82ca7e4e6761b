import { type SaveState, saveWords } from "../wording/save-words";

/** Says whether the page's own edits are stored; a tick when they are. */
export function SaveMark(props: { readonly state: SaveState }) {
  return (
    <div className="saved" role="status" data-save={props.state.kind}>
      {props.state.kind === "saved" && (
        <svg width="14" height="12" viewBox="0 0 14 12" aria-hidden="true">
          <path d="M1.5 6.5l4 4L12.5 1.5" fill="none" stroke="currentColor" strokeWidth="2" />
        </svg>
      )}
      <span className={props.state.kind === "refused" ? "worse" : ""}>
        {saveWords(props.state)}
      </span>
    </div>
  );
}
