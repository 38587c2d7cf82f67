import type { BaselineFamily } from '@/lib/case/plan';

/**
 * Id of the path from a site to a channel.
 * @param siteId slug of the site
 * @param channelId slug of the channel
 * @returns "site/channel"
 * @source house rule
 */
export function pathIdOf(siteId: string, channelId: string): string {
  return `${siteId}/${channelId}`;
}

/**
 * Key of a baseline: path, electrode and family are never mixed.
 * @param pathId id of the path
 * @param electrodeId slug of the stimulating electrode
 * @param family baseline family
 * @returns "path|electrode|family"
 * @source house rule
 */
export function baselineKey(pathId: string, electrodeId: string, family: BaselineFamily): string {
  return `${pathId}|${electrodeId}|${family}`;
}

/**
 * Key of a segment as one channel sees it.
 * @param channelId slug of the channel
 * @param proximalSiteId slug of the proximal site
 * @param distalSiteId slug of the distal site
 * @returns "channel|proximal|distal"
 * @source house rule
 */
export function segmentKey(channelId: string, proximalSiteId: string, distalSiteId: string): string {
  return `${channelId}|${proximalSiteId}|${distalSiteId}`;
}

/**
 * Path from the proximal end of a segment: what is slow or weak across a segment shows in the response from there.
 * @param key key of a segment, "channel|proximal|distal"
 * @returns "proximal/channel"
 * @source house rule
 */
export function segmentPathId(key: string): string {
  const [channelId = '', proximalSiteId = ''] = key.split('|');
  return pathIdOf(proximalSiteId, channelId);
}

/**
 * Channel of a path.
 * @param pathId "site/channel"
 * @returns slug of the channel
 * @source house rule
 */
export function channelOfPath(pathId: string): string {
  return pathId.slice(pathId.indexOf('/') + 1);
}
