import { createRoot } from 'react-dom/client';

import { NotLivePicture } from '@/app/_features/theatre/not-live-picture';
import { PairingPicture } from '@/app/_features/theatre/pairing-picture';
import { TheatrePicture } from '@/app/_features/theatre/theatre-picture';
import { wallSettings } from '@/app/_features/theatre/wall-settings';
import { wallStates } from '@/tests/support/theatre-gallery/wall-states';

const settings = wallSettings(window.location.search, null);
const query = new URLSearchParams(window.location.search);
const name = query.get('state') ?? '';
const deskWords = query.has('desk') ? 'Desk not connected since 10:41' : null;

function Gallery() {
  if (name === 'not-paired') return <PairingPicture pairing={{ code: 'K7Q4XM', words: 'amber kestrel' }} ended={null} problem={null} settings={settings} />;
  if (name === 'ended') return <PairingPicture pairing={{ code: 'B2W9RT', words: 'quiet harbour' }} ended="Case closed 11:58" problem={null} settings={settings} />;
  if (name.startsWith('not-live-')) {
    const then = wallStates[name.slice('not-live-'.length)]?.();
    return then === undefined ? null : (
      <NotLivePicture
        place={then.place}
        procedure={then.procedure}
        reason="No word from the log. Ask the neurophysiologist."
        lastLive={then.clock}
        lines={[then.view.lead, ...then.view.others]}
        settings={settings}
      />
    );
  }
  const shown = wallStates[name]?.();
  return shown === undefined ? <p>{Object.keys(wallStates).join(' ')}</p> : <TheatrePicture {...shown} isLive deskWords={deskWords} settings={settings} />;
}

const root = document.getElementById('root');
document.documentElement.dataset.theme = settings.theme;
if (root !== null) createRoot(root).render(<Gallery />);
