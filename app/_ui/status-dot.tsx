/** A filled dot for what is there, a ring for what is not, always with its words. */
export function StatusDot({ isOn, children }: { readonly isOn: boolean; readonly children: string }) {
  return (
    <span className="inline-flex items-center gap-2 whitespace-nowrap">
      <svg viewBox="0 0 10 10" className="size-2.5 shrink-0" aria-hidden="true">
        <circle cx="5" cy="5" r={isOn ? 4.5 : 3.6} fill={isOn ? 'currentColor' : 'none'} stroke="currentColor" strokeWidth={isOn ? 0 : 1.6} />
      </svg>
      {children}
    </span>
  );
}
