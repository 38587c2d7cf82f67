'use client';

import { useLogCase } from '@/app/_features/log/log-context';
import type { ScreenLine } from '@/lib/contracts/http/account';
import { Button } from '@/app/_ui/button';
import { StatusDot } from '@/app/_ui/status-dot';
import { clockTime } from '@/lib/text/format';

/** The walls of this case; each can be ended from here. */
export function WallList({ screens, onRevoke }: { readonly screens: readonly ScreenLine[]; readonly onRevoke: (screenId: string) => void }) {
  const { timeZone } = useLogCase();
  if (screens.length === 0) return <p className="mt-5 text-second">No wall is paired yet</p>;
  return (
    <ul className="mt-5 border-t border-rule">
      {screens.map((screen) => (
        <li key={screen.screenId} className="flex items-center justify-between gap-4 border-b border-rule py-1.5">
          <StatusDot isOn={screen.isConnected}>{`Wall paired ${clockTime(screen.pairedAt, timeZone)}`}</StatusDot>
          {screen.endedAt === null ? <Button onClick={() => onRevoke(screen.screenId)}>End this wall</Button> : <span className="text-second">{`Ended ${clockTime(screen.endedAt, timeZone)}`}</span>}
        </li>
      ))}
    </ul>
  );
}
