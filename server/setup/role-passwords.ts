import { createHmac } from 'node:crypto';

/** The logins that the program uses; `fascicle_owner` owns the tables and cannot log in. */
export const loginRoles = ['fascicle_app', 'fascicle_feed', 'fascicle_audit', 'fascicle_migrate'] as const;
export type LoginRole = (typeof loginRoles)[number];

/** A login role's password follows from the installation's secret, so that it is stored nowhere else. */
export function rolePassword(secret: string, role: LoginRole): string {
  return createHmac('sha256', secret).update(role).digest('base64url');
}
