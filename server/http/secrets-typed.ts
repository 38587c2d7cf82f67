import type { Contract } from '@/server/http/read-json';
import type { ContractIssue } from '@/server/http/problem-of';

/** Longest password and code that are looked at. House rule. */
const longest = { password: 256, code: 10 } as const;

/** Password and code of someone who gives them again: exactly these two texts. */
export const secretsTyped: Contract<{ password: string; code: string }> = {
  parse(value) {
    const issue = firstIssue(value);
    if (issue !== null) throw Object.assign(new Error(issue.message), { issues: [issue] });
    const { password, code } = value as { password: string; code: string };
    return { password, code };
  },
};

function firstIssue(value: unknown): ContractIssue | null {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return { path: [], message: 'Not an object: password and code are needed' };
  const unknownKey = Object.keys(value).find((key) => !Object.hasOwn(longest, key));
  if (unknownKey !== undefined) return { path: [unknownKey], message: 'Unknown field: password and code are allowed' };
  for (const [field, max] of Object.entries(longest)) {
    const text: unknown = Object.getOwnPropertyDescriptor(value, field)?.value;
    if (typeof text !== 'string' || text === '' || text.length > max || !text.isWellFormed() || text.includes('\u0000')) {
      return { path: [field], message: `Not text: 1 to ${max} characters are allowed` };
    }
  }
  return null;
}
