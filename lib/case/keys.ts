import type { BaselineFamily } from '@/lib/case/plan';

/** Id of the path from a site to a channel. @returns "site/channel" @source house rule */
export function pathIdOf(siteId: string, channelId: string): string {
  return `${siteId}/${channelId}`;
}

/** Key of a baseline: path, electrode and family are never mixed. @returns "path|electrode|family" @source house rule */
export function baselineKey(pathId: string, electrodeId: string, family: BaselineFamily): string {
  return `${pathId}|${electrodeId}|${family}`;
}

/** Key of a segment as one channel sees it. @returns "channel|proximal|distal" @source house rule */
export function segmentKey(channelId: string, proximalSiteId: string, distalSiteId: string): string {
  return `${channelId}|${proximalSiteId}|${distalSiteId}`;
}
