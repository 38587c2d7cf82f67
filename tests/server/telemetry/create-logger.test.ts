import { describe, expect, it } from 'vitest';
import { createLogger } from '@/server/telemetry/create-logger';

function logged(fields: object): string {
  const lines: string[] = [];
  createLogger({ level: 'info', destination: { write: (line) => void lines.push(line) } }).info(fields, 'said');
  return lines.join('');
}

describe('createLogger', () => {
  it.each([
    ['a cookie', { req: { headers: { cookie: 'hidden-value' } } }],
    ['an authorization', { req: { headers: { authorization: 'hidden-value' } } }],
    ['a cookie that is set', { res: { headers: { 'set-cookie': 'hidden-value' } } }],
    ['a password', { password: 'hidden-value' }],
    ['a password in a body', { req: { body: { password: 'hidden-value' } } }],
    ['a code in a body', { body: { code: 'hidden-value' } }],
    ['a token', { session: { token: 'hidden-value' } }],
  ])('never writes %s', (_what, fields) => {
    expect(logged(fields)).not.toContain('hidden-value');
    expect(logged(fields)).toContain('[not logged]');
  });

  it('writes what it is for', () => {
    expect(logged({ caseId: 'case-1' })).toContain('"caseId":"case-1"');
  });
});
