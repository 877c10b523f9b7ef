/**
 * The one permission table. A role says what a person may do; a grant on a portfolio says where.
 * The API's wrapper, the pages and the tests all read this table; nothing else decides who may do what.
 */
export const roles = ['administrator', 'librarian', 'evaluator', 'author', 'reader'] as const;
export type Role = (typeof roles)[number];

/** Levels of a grant on a portfolio, each including those before it. */
export const grantLevels = ['view', 'contribute', 'manage'] as const;
export type GrantLevel = (typeof grantLevels)[number];

interface Permission {
  /** What it allows, in plain words; shown on the administration pages. */
  description: string;
  roles: readonly Role[];
  /** Least grant on the portfolio concerned; null where no portfolio is concerned. Administrators count as 'manage' everywhere. */
  grant: GrantLevel | null;
}

const everybody = roles;
const curators = ['administrator', 'librarian'] as const;
const evaluators = ['administrator', 'evaluator'] as const;
const administrators = ['administrator'] as const;

export const permissions = {
  'account.use': { description: 'Change own password, make and revoke own tokens', roles: everybody, grant: null },
  'portfolio.list': { description: 'List the portfolios that one was given', roles: everybody, grant: null },
  'portfolio.create': { description: 'Create portfolios', roles: curators, grant: null },
  'portfolio.view': { description: 'See a portfolio, its works, analyses and maps', roles: everybody, grant: 'view' },
  'portfolio.edit': { description: 'Rename, describe, give to others, delete a portfolio', roles: curators, grant: 'manage' },
  'portfolio.curate': { description: 'Add works to a portfolio and remove them', roles: curators, grant: 'contribute' },
  'import.create': { description: 'Upload reference exports', roles: curators, grant: 'contribute' },
  'import.decide': { description: 'Accept, set aside and undo imports', roles: curators, grant: 'contribute' },
  'match.decide': { description: 'Decide whether two works are the same', roles: curators, grant: 'contribute' },
  'work.view': { description: 'See works, their records, references and citations', roles: everybody, grant: null },
  'analysis.run': { description: 'Run, cancel and verify analyses', roles: evaluators, grant: 'view' },
  'export.make': { description: 'Export tables and networks', roles: ['administrator', 'librarian', 'evaluator'], grant: 'view' },
  'people.find': { description: 'Find people to give a portfolio to', roles: curators, grant: null },
  'user.manage': { description: 'Invite, change and disable users', roles: administrators, grant: null },
  'unit.view': { description: 'See the units of the institution', roles: everybody, grant: null },
  'unit.manage': { description: 'Change the units of the institution', roles: administrators, grant: null },
  'mail.view': { description: 'See sent mail', roles: administrators, grant: null },
  'job.view': { description: 'See all jobs', roles: administrators, grant: null },
  'audit.view': { description: 'See the audit log', roles: administrators, grant: null },
} as const satisfies Record<string, Permission>;

export type Action = keyof typeof permissions;

export function roleMay(role: Role, action: Action): boolean {
  return (permissions[action].roles as readonly Role[]).includes(role);
}

export function levelReaches(level: GrantLevel, least: GrantLevel): boolean {
  return grantLevels.indexOf(level) >= grantLevels.indexOf(least);
}

/** Who acts: a signed-in person, through the browser or through a token. */
export interface Actor {
  userId: number;
  name: string;
  email: string;
  role: Role;
  via: 'session' | 'token';
}

/** Whether somebody with this role and this grant may do it; the level is null where the person was given nothing. */
export function may(actor: Pick<Actor, 'role'>, action: Action, level: GrantLevel | null): boolean {
  const permission: Permission = permissions[action];
  if (!permission.roles.includes(actor.role)) return false;
  if (permission.grant === null) return true;
  const held = actor.role === 'administrator' ? 'manage' : level;
  return held !== null && levelReaches(held, permission.grant);
}
