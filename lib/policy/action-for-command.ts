import type { CaseCommandName } from '@/lib/case/commands';
import type { Action } from '@/lib/policy/action';

/**
 * The action that a command to an existing case needs.
 *
 * @param name name of the command
 * @returns the action the policy is asked for; planning is an action on the hospital and has a door of its own
 * @source house rule
 * @example actionForCommand('send-message') // 'send-message'
 */
export function actionForCommand(name: CaseCommandName): Action {
  if (name === 'plan-case') return 'plan-case';
  if (name === 'miss-repeat') return 'run-timer';
  if (name === 'note-painted') return 'confirm-paint';
  const isOwnAction = name === 'send-message' || name === 'accept-baseline' || name === 'give-advice' || name === 'confirm-baseline';
  return isOwnAction ? name : 'write-case';
}
