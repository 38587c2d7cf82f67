/**
 * Everything that anyone can ask of the product; what is not in this list cannot be asked.
 * @source house rule: default deny
 */
export const actions = [
  'list-cases',
  'plan-case',
  'list-people',
  'see-case',
  'see-identity',
  'write-case',
  'send-message',
  'accept-baseline',
  'give-advice',
  'confirm-baseline',
  'pair-screen',
  'see-screens',
  'revoke-screen',
  'confirm-paint',
  'run-timer',
  'see-account',
  'reauthenticate',
] as const;

/** Name of an action. */
export type Action = (typeof actions)[number];
