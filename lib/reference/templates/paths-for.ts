import type { Channel, Nerve, Path } from '@/lib/alert/nerve-plan';

/**
 * Every path of a plan: each site to each channel of the same nerve that lies distal to it.
 *
 * Method: a site past its channel records nothing on it, so such a pair is left out. A required path is one that
 * calm depends on; it is named by the channel. It does not look at crossing fibres between two nerves.
 *
 * @param nerves nerves with their sites, positions in mm; not modified
 * @param channels channels with their positions in mm; not modified
 * @param requiredChannelIds ids of the channels whose paths are required; not modified
 * @returns paths in the order of nerves, sites and channels; empty when no channel lies distal to a site
 * @source house rule
 * @accuracy exact; tests/lib/reference/templates/paths-for.test.ts
 * @example
 * pathsFor([], [], []) // => []
 */
export function pathsFor(
  nerves: readonly Nerve[],
  channels: readonly Channel[],
  requiredChannelIds: readonly string[],
): readonly Path[] {
  return nerves.flatMap((nerve) =>
    nerve.sites.flatMap((site) =>
      channels
        .filter((channel) => channel.nerveId === nerve.id && channel.positionMm > site.positionMm)
        .map((channel) => ({
          id: `${site.id}/${channel.id}`,
          nerveId: nerve.id,
          siteId: site.id,
          channelId: channel.id,
          isRequired: requiredChannelIds.includes(channel.id),
        })),
    ),
  );
}
