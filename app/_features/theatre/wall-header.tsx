interface WallHeaderProps {
  /** Theatre and side in words: the one thing that must never be taken for another case. */
  readonly place: string;
  readonly procedure: string;
  readonly clock: string;
  readonly isLive: boolean;
}

/** Where and which side at state size, what operation, whether the picture is live, and the theatre's time. */
export function WallHeader({ place, procedure, clock, isLive }: WallHeaderProps) {
  return (
    <header className="flex flex-wrap items-baseline gap-x-[0.8em] px-(--edge-room) py-[0.45em] text-(length:--needed) leading-[1.15]">
      <p className="text-(length:--state) font-bold">{place}</p>
      <p className="min-w-0 flex-1 basis-[8em] text-second">{procedure}</p>
      <p className="ml-auto flex items-center gap-[0.5em] self-center">
        {isLive ? <LiveDot /> : null}
        <time className="font-mono">{clock}</time>
      </p>
    </header>
  );
}

function LiveDot() {
  return (
    <span className="inline-flex items-center gap-[0.35em] text-second">
      <svg viewBox="0 0 10 10" className="size-[0.45em] text-ink" aria-hidden="true">
        <circle cx="5" cy="5" r="5" fill="currentColor" />
      </svg>
      Live
    </span>
  );
}
