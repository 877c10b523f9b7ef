export const unitKinds = ['institution', 'faculty', 'department', 'institute', 'group', 'project'] as const;
export type UnitKind = (typeof unitKinds)[number];
