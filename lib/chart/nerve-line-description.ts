import type { NerveLineView } from '@/lib/chart/nerve-line';

/**
 * The nerve line in sentences, for a reader who does not see it.
 * @param view the nerve line without its description; not modified
 * @returns sentences: nerve and channel, each site with response and age, each segment with its text and state
 * @source house rule: every picture has a text that says what it shows
 * @accuracy tests/lib/chart/nerve-line-view.test.ts
 * @example
 * nerveLineDescription(view) // => 'Ulnar nerve, recorded at ADM. Wrist 99 %, 20 s ago. Wrist to ADM: 2.90 ms.'
 */
export function nerveLineDescription(view: Omit<NerveLineView, 'description'>): string {
  const names = [...view.sites.map((site) => site.name), view.end?.name ?? 'the channel'];
  const sites = view.sites.map((site) => `${site.name} ${site.text}${site.ageText === null ? '' : `, ${site.ageText} ago`}.`);
  const segments = view.segments.map((segment, index) => {
    const state = segment.isNotCompared ? 'not compared' : segment.isUntested ? 'not tested since' : '';
    const words = segment.text.endsWith(state) ? segment.text : `${segment.text}, ${state}`.replace(/^, /, '');
    return words === '' ? '' : `${names[index] ?? ''} to ${lowerFirst(names[index + 1] ?? '', index + 1 === names.length - 1)}: ${words}.`;
  });
  return [`${view.nerveName} nerve, recorded at ${view.end?.name ?? 'no channel'}.`, ...sites, ...segments.filter((sentence) => sentence !== '')].join(' ');
}

function lowerFirst(name: string, isChannel: boolean): string {
  return isChannel ? name : name.charAt(0).toLowerCase() + name.slice(1);
}
