import { describe, expect, it } from 'vitest';

import { grantLevels, may, permissions, roleMay, roles, type Action, type GrantLevel, type Role } from '@/lib/access/permissions';

/** Written out by hand a second time, so that a change of the table is a change made on purpose. */
const allowed: Record<Action, string> = {
  'account.use': 'administrator librarian evaluator author reader',
  'portfolio.list': 'administrator librarian evaluator author reader',
  'portfolio.create': 'administrator librarian',
  'portfolio.view': 'administrator librarian evaluator author reader',
  'portfolio.edit': 'administrator librarian',
  'portfolio.curate': 'administrator librarian',
  'import.create': 'administrator librarian',
  'import.decide': 'administrator librarian',
  'match.decide': 'administrator librarian',
  'work.view': 'administrator librarian evaluator author reader',
  'analysis.run': 'administrator evaluator',
  'export.make': 'administrator librarian evaluator',
  'people.find': 'administrator librarian',
  'user.manage': 'administrator',
  'unit.view': 'administrator librarian evaluator author reader',
  'unit.manage': 'administrator',
  'mail.view': 'administrator',
  'job.view': 'administrator',
  'audit.view': 'administrator',
};

describe('the permission table', () => {
  it('allows each role what it is meant to, and nothing else', () => {
    for (const action of Object.keys(permissions) as Action[]) expect(roles.filter((role) => roleMay(role, action)).join(' '), action).toBe(allowed[action]);
  });

  it('asks for the grant beside the role wherever a portfolio is concerned', () => {
    for (const action of Object.keys(permissions) as Action[]) {
      const least: GrantLevel | null = permissions[action].grant;
      for (const role of roles) {
        for (const level of [null, ...grantLevels]) {
          const reaches = least === null || role === 'administrator' || (level !== null && grantLevels.indexOf(level) >= grantLevels.indexOf(least));
          expect(may({ role }, action, level), `${role} ${action} ${level}`).toBe(roleMay(role, action) && reaches);
        }
      }
    }
  });

  it('lets nobody but administrators do anything in a portfolio that they were not given', () => {
    for (const role of roles.filter((role): role is Exclude<Role, 'administrator'> => role !== 'administrator')) {
      for (const action of Object.keys(permissions) as Action[]) if (permissions[action].grant !== null) expect(may({ role }, action, null)).toBe(false);
    }
  });
});
