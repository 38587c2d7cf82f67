const dashes = [undefined, '7 4', '2 3', '10 3 2 3', '5 2', '1 4'] as const;

/** The dashes of a line, so that lines differ without colour. */
export function trendDash(index: number): { readonly strokeDasharray?: string } {
  const dash = dashes[index % dashes.length];
  return dash === undefined ? {} : { strokeDasharray: dash };
}

/** The mark of one run: a shape for its line, a red triangle where an alert was raised. */
export function TrendMark({ x, y, lineIndex, isAlert }: { readonly x: number; readonly y: number; readonly lineIndex: number; readonly isAlert: boolean }) {
  if (isAlert) return <path d={`M${x} ${y - 8}l8 14h-16Z`} fill="var(--high)" />;
  if (lineIndex % 4 === 1) return <rect x={x - 3.5} y={y - 3.5} width={7} height={7} fill="var(--ink)" />;
  if (lineIndex % 4 === 2) return <circle cx={x} cy={y} r={4} fill="var(--ground)" stroke="var(--ink)" strokeWidth={1.75} />;
  if (lineIndex % 4 === 3) return <path d={`M${x} ${y - 5.5}l5.5 5.5 -5.5 5.5 -5.5 -5.5Z`} fill="var(--ground)" stroke="var(--ink)" strokeWidth={1.75} />;
  return <circle cx={x} cy={y} r={3.75} fill="var(--ink)" />;
}

/** Which line is which. */
export function TrendKey({ names }: { readonly names: readonly string[] }) {
  return (
    <ul className="flex flex-wrap gap-x-6 text-sm text-second">
      {names.map((name, index) => (
        <li key={name} className="inline-flex items-center gap-2">
          <svg width="34" height="12" viewBox="0 0 34 12" aria-hidden="true">
            <line x1="0" x2="34" y1="6" y2="6" stroke="var(--ink)" strokeWidth="1.75" {...trendDash(index)} />
            <TrendMark x={17} y={6} lineIndex={index} isAlert={false} />
          </svg>
          {name}
        </li>
      ))}
    </ul>
  );
}
