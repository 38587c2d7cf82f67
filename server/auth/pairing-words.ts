import { randomInt } from 'node:crypto';

/** Letters and digits that are not taken for each other on a wall or when read aloud. House rule. */
const codeSigns = 'ACDEFHJKMNPRTUVWXY34679';

/** Plain words of our own, each clear when spoken, none of the trade, none a name. */
const words = [
  'amber', 'anchor', 'apple', 'arrow', 'autumn', 'bamboo', 'banner', 'barley', 'basket', 'beacon', 'blanket', 'bottle',
  'branch', 'breeze', 'bridge', 'bucket', 'butter', 'button', 'cabin', 'candle', 'canoe', 'carpet', 'castle', 'cedar',
  'cherry', 'circle', 'cloud', 'clover', 'coffee', 'copper', 'corner', 'cotton', 'cradle', 'curtain', 'daisy', 'desert',
  'dolphin', 'domino', 'dragon', 'drawer', 'eagle', 'ember', 'engine', 'falcon', 'feather', 'fiddle', 'forest', 'fossil',
  'fountain', 'garden', 'ginger', 'glacier', 'granite', 'guitar', 'hammer', 'harbour', 'hazel', 'helmet', 'honey', 'island',
  'ivory', 'jacket', 'jasmine', 'kettle', 'ladder', 'lantern', 'lemon', 'lobster', 'magnet', 'maple', 'marble', 'meadow',
  'melon', 'mirror', 'monsoon', 'mustard', 'napkin', 'nutmeg', 'olive', 'orange', 'orchard', 'otter', 'paddle', 'panther',
  'paper', 'parrot', 'pebble', 'pepper', 'pillow', 'planet', 'pocket', 'prairie', 'pumpkin', 'quarry', 'rabbit', 'raven',
  'ribbon', 'river', 'rocket', 'saddle', 'salmon', 'sandal', 'scarlet', 'shadow', 'silver', 'spider', 'spruce', 'summer',
  'sunset', 'teapot', 'thunder', 'timber', 'tomato', 'tulip', 'tunnel', 'turtle', 'valley', 'velvet', 'violin', 'walnut',
  'water', 'willow', 'window', 'winter', 'wizard', 'yellow', 'yoghurt', 'zebra',
] as const;

/** A code of six signs, as a wall shows it. */
export function newPairingCode(): string {
  return Array.from({ length: 6 }, () => codeSigns.charAt(randomInt(codeSigns.length))).join('');
}

/** Two different words, shown on the wall and at the desk and read aloud. */
export function newPairingWords(): string {
  const first = randomInt(words.length);
  const second = (first + 1 + randomInt(words.length - 1)) % words.length;
  return `${words[first]} ${words[second]}`;
}
