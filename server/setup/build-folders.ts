import path from 'node:path';

export type BuildFolders = Readonly<{
  /** Next's output, relative to the clone; null is Next's own choice. */
  nextFolder: string | null;
  /** The bundles of the server and its workers, and the stamp of what they were built from. */
  bundleFolder: string;
  serverFile: string;
}>;

/** Where the product is built: one place for the product itself, another for the tests, so that neither disturbs the other. */
export function buildFolders(root: string, buildFolder = process.env.FASCICLE_BUILD_FOLDER): BuildFolders {
  const bundleFolder = path.resolve(root, buildFolder ?? 'dist');
  return { nextFolder: buildFolder === undefined ? null : path.join(buildFolder, 'next'), bundleFolder, serverFile: path.join(bundleFolder, 'server.mjs') };
}

/** What the programs that read `next.config.mjs` must find in their environment. */
export function buildEnvironment({ nextFolder }: BuildFolders): Readonly<Record<string, string>> {
  return { NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1', ...(nextFolder === null ? {} : { NEXT_DIST_DIR: nextFolder }) };
}
