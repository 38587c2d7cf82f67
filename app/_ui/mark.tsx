const plainRemPx = 16;

/** The sign of the product: a bundle of fibres as it looks under the microscope. Silent; the name stands beside it. Grows with the page's letters. */
export function Mark({ sizePx = 24 }: { readonly sizePx?: number }) {
  return (
    <svg width={`${sizePx / plainRemPx}rem`} height={`${sizePx / plainRemPx}rem`} viewBox="0 0 32 32" aria-hidden="true" className="shrink-0">
      <circle cx="16" cy="16" r="14" fill="none" className="stroke-ink" strokeWidth="2.4" />
      <g className="fill-stain">
        <circle cx="16" cy="15.6" r="3.6" />
        <circle cx="10.2" cy="9.6" r="2.9" />
        <circle cx="17.6" cy="7.6" r="2.1" />
        <circle cx="23.6" cy="11" r="2.7" />
        <circle cx="23" cy="19.4" r="2.3" />
        <circle cx="18.6" cy="24.2" r="2.5" />
        <circle cx="11.6" cy="22.6" r="2.7" />
        <circle cx="7.8" cy="16.6" r="2" />
      </g>
    </svg>
  );
}
