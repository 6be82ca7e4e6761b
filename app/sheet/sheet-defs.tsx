/** The hatches of the drawing, referred to by the styles. */
export function SheetDefs() {
  return (
    <defs>
      <pattern
        id="hatch-check"
        width="6"
        height="6"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(45)"
      >
        <path className="pat-check-l" d="M0 0V6" />
      </pattern>
      <pattern
        id="hatch-over"
        width="4"
        height="4"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(45)"
      >
        <path className="pat-over" d="M0 0V4" />
      </pattern>
    </defs>
  );
}
