/** What PostgreSQL's programs find around them: nothing of the person who starts them, least of all PGHOST or PGDATA. */
export const postgresEnvironment: NodeJS.ProcessEnv = { PATH: '/usr/bin:/bin', LC_ALL: 'C.UTF-8', NODE_ENV: 'production' };
