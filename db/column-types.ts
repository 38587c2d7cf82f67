import pg from 'pg';

const TIMESTAMPTZ = 1184;
const INT8 = 20;

/** A moment as RFC 3339 in UTC with milliseconds, the form it has in entries and on the wire. */
function readMoment(text: string): string {
  return new Date(text).toISOString();
}

/** A bigint as a number; one that a number cannot hold is an error and never rounded. */
function readWhole(text: string): number {
  const whole = Number(text);
  if (!Number.isSafeInteger(whole)) throw new RangeError(`The database holds ${text}; at most ${Number.MAX_SAFE_INTEGER} is allowed.`);
  return whole;
}

/** How PostgreSQL's types arrive in the program; bytea stays a Buffer and jsonb an object, as pg reads them. */
export const columnTypes = {
  getTypeParser(oid: number, format: string = 'text'): (value: string) => unknown {
    if (format === 'binary') return pg.types.getTypeParser(oid, 'binary');
    if (oid === TIMESTAMPTZ) return readMoment;
    if (oid === INT8) return readWhole;
    return pg.types.getTypeParser(oid, 'text');
  },
};
