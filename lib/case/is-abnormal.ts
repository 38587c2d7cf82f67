import type { Finding } from '@/lib/alert/judgement';

/** Whether findings reach a limit, that is notice or more. A watch alone does not. @returns true from notice on @source house rule */
export function isAbnormal(findings: readonly Finding[]): boolean {
  return findings.some((finding) => finding.priority === 'notice');
}
