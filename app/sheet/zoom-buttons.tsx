import type { Zoom } from "./use-zoom";

/** In the margin, lower left: closer, farther, whole sheet. */
export function ZoomButtons({ zoom }: { readonly zoom: Zoom }) {
  const whole = zoom.view.scale === 1;
  return (
    <fieldset className="zoombuttons" aria-label="View of the sheet">
      <button type="button" aria-label="Closer" onClick={zoom.enlarge}>
        <svg viewBox="0 0 12 12" aria-hidden="true">
          <path d="M1 6H11M6 1V11" />
        </svg>
      </button>
      <button type="button" aria-label="Farther" disabled={whole} onClick={zoom.reduce}>
        <svg viewBox="0 0 12 12" aria-hidden="true">
          <path d="M1 6H11" />
        </svg>
      </button>
      <button type="button" aria-label="Whole sheet" disabled={whole} onClick={zoom.fit}>
        <svg viewBox="0 0 12 12" aria-hidden="true">
          <path d="M1 2H11V10H1Z" />
        </svg>
      </button>
    </fieldset>
  );
}
