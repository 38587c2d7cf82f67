import { pino, type DestinationStream, type Logger } from 'pino';

/** Fields that never reach a log, wherever a request, a reply or a body is written. */
const neverLogged = ['password', 'newPassword', 'code', 'secret', 'token', 'pairingCode', 'authorization', 'cookie', '["set-cookie"]'];

const redactedPaths = [
  ...['req', 'request', 'res', 'response'].flatMap((side) => ['cookie', 'authorization', '["set-cookie"]'].map((header) => joinPath(`${side}.headers`, header))),
  ...neverLogged,
  ...neverLogged.map((field) => joinPath('*', field)),
  ...['password', 'newPassword', 'code', 'secret', 'token', 'pairingCode'].map((field) => joinPath('*.body', field)),
];

function joinPath(before: string, field: string): string {
  return field.startsWith('[') ? before + field : `${before}.${field}`;
}

/** A logger of JSON lines whose cookies, passwords, codes and tokens are blanked before they are written. */
export function createLogger(options: { level: string; destination?: DestinationStream }): Logger {
  const settings = { level: options.level, redact: { paths: redactedPaths, censor: '[not logged]' }, base: null };
  return options.destination === undefined ? pino(settings) : pino(settings, options.destination);
}
