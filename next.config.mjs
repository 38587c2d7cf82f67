import path from 'node:path';

const testBuild = process.env.NEXT_DIST_DIR !== undefined;

/** @type {import('next').NextConfig} */
const nextConfig = {
  poweredByHeader: false,
  reactStrictMode: true,
  agentRules: false,
  // The tests build beside a running product and must not touch its files, nor the tracked tsconfig.json.
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  typescript: { tsconfigPath: testBuild ? path.join(process.env.NEXT_DIST_DIR, '..', 'tsconfig.json') : 'tsconfig.json' },
  // knex requires dialects that are not installed; the others hold native or instance-wide parts.
  serverExternalPackages: ['knex', 'pg', 'pino', '@node-rs/argon2', 'socket.io'],
  turbopack: { root: import.meta.dirname },
};

export default nextConfig;
