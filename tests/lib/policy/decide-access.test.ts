import { describe, expect, test } from 'vitest';

import { actionForCommand } from '@/lib/policy/action-for-command';
import { actions, type Action } from '@/lib/policy/action';
import type { Actor, Role } from '@/lib/policy/actor';
import { decideAccess } from '@/lib/policy/decide-access';
import type { CaseResource, Resource } from '@/lib/policy/resource';

import { accountMatrix, caseMatrix, columns, hospitalMatrix } from './access-matrix';

const roles: readonly Role[] = ['neurophysiologist', 'surgeon', 'physician', 'reviewer', 'administrator'];
const statuses = ['planned', 'open', 'closed'] as const;
const here = 'hospital-here';
const elsewhere = 'hospital-elsewhere';

function cell(matrix: Readonly<Record<string, string>>, row: string, action: Action): boolean {
  const signs = matrix[row]?.split(' ');
  if (signs === undefined) throw new Error(`No row "${row}" in the matrix.`);
  if (signs.length !== columns.length) throw new Error(`Row "${row}" has ${signs.length} cells, not ${columns.length}.`);
  const sign = signs[columns.indexOf(action)];
  if (sign !== '+' && sign !== '.') throw new Error(`No cell for "${action}" in row "${row}".`);
  return sign === '+';
}

function actorOf(who: string, hospitalId = here): Actor {
  if (who === 'nobody') return { kind: 'none' };
  if (who === 'timer') return { kind: 'timer' };
  if (who === 'screen') return { kind: 'screen', screenId: 's', hospitalId, caseId: 'case-1' };
  const memberships = who === 'former-member' ? [] : [{ hospitalId, role: who as Role }];
  return { kind: 'person', personId: 'me', memberships };
}

function caseOf(who: string, relation: string, status: CaseResource['status']): CaseResource {
  const otherRole = roles[(roles.indexOf(who as Role) + 1) % roles.length] as Role;
  const mine = { personId: 'me', role: who === 'former-member' ? ('neurophysiologist' as const) : (who as Role) };
  const assignments = {
    assigned: [mine],
    'assigned-otherwise': [{ personId: 'me', role: otherRole }],
    unassigned: [{ personId: 'another', role: who as Role }],
    'other-hospital': [mine],
  }[relation];
  return { kind: 'case', hospitalId: here, caseId: relation === 'another' ? 'case-2' : 'case-1', status, assignments: assignments ?? [] };
}

const people = roles.flatMap((who) => ['assigned', 'assigned-otherwise', 'unassigned', 'other-hospital'].map((relation) => [who, relation] as const));
const others = [['former-member', 'assigned'], ['screen', 'own'], ['screen', 'another'], ['timer', 'any'], ['nobody', 'any']] as const;

describe('decideAccess on a case', () => {
  for (const [who, relation] of [...people, ...others]) {
    for (const status of statuses) {
      test(`${who}, ${relation}, ${status}`, () => {
        const actor = actorOf(who, relation === 'other-hospital' ? elsewhere : here);
        for (const action of actions) {
          const decision = decideAccess(actor, action, caseOf(who, relation, status));
          expect([action, decision.isAllowed]).toEqual([action, cell(caseMatrix, `${who} ${relation} ${status}`, action)]);
          expect(decision.rule === 'no-rule').toBe(!decision.isAllowed);
        }
      });
    }
  }

  test('has no row that no test reads, and a column for every action', () => {
    expect([...columns]).toEqual([...actions]);
    expect(Object.keys(caseMatrix).length).toBe((people.length + others.length) * statuses.length);
  });
});

describe('decideAccess on hospital and account', () => {
  const asked = (matrix: Readonly<Record<string, string>>, resourceOf: (relation: string) => Resource) => {
    for (const row of Object.keys(matrix)) {
      test(row, () => {
        const [who = '', relation = ''] = row.split(' ');
        for (const action of actions) {
          const { isAllowed } = decideAccess(actorOf(who), action, resourceOf(relation));
          expect([action, isAllowed]).toEqual([action, cell(matrix, row, action)]);
        }
      });
    }
  };
  asked(hospitalMatrix, (relation) => ({ kind: 'hospital', hospitalId: relation === 'own-hospital' ? here : elsewhere }));
  asked(accountMatrix, (relation) => ({ kind: 'account', personId: relation === 'own' ? 'me' : 'another' }));
});

describe('decideAccess with what it does not know', () => {
  const planned = caseOf('neurophysiologist', 'assigned', 'planned');

  test('denies an undefined actor, action and resource', () => {
    const known = actorOf('neurophysiologist');
    expect(decideAccess({} as Actor, 'see-case', planned).isAllowed).toBe(false);
    expect(decideAccess(known, undefined as unknown as Action, planned).isAllowed).toBe(false);
    expect(decideAccess(known, 'erase-case' as Action, planned).isAllowed).toBe(false);
    expect(decideAccess(known, 'see-case', {} as Resource).isAllowed).toBe(false);
    expect(decideAccess(known, 'see-case', { ...planned, status: 'sealed' as 'closed' }).isAllowed).toBe(false);
  });

  test('two hospitals do not lend roles to each other', () => {
    const both: Actor = {
      kind: 'person',
      personId: 'me',
      memberships: [{ hospitalId: elsewhere, role: 'neurophysiologist' }, { hospitalId: here, role: 'administrator' }],
    };
    expect(decideAccess(both, 'see-case', planned).isAllowed).toBe(false);
  });

  test('names the rule that allowed', () => {
    expect(decideAccess(actorOf('screen'), 'see-case', planned).rule).toBe('wall-of-the-case');
    expect(decideAccess(actorOf('reviewer'), 'see-case', caseOf('reviewer', 'unassigned', 'closed')).rule).toBe('reviewer-of-closed-cases');
  });
});

test('actionForCommand keeps timers and planning out of the people\'s door', () => {
  expect(actionForCommand('miss-repeat')).toBe('run-timer');
  expect(actionForCommand('plan-case')).toBe('plan-case');
  expect(actionForCommand('send-message')).toBe('send-message');
  expect(actionForCommand('log-run')).toBe('write-case');
});
