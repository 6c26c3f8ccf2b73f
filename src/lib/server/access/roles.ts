/** The roles of a team; one person may hold several. A guest has none: shared links are read-only. */
export const roles = [
	'cartographer',
	'analyst',
	'planner',
	'designer',
	'approver',
	'admin',
] as const;
export type Role = (typeof roles)[number];

/** What can be done in a team; every service call and route names one of these. */
export const actions = [
	'team.read',
	'team.manage',
	'members.manage',
	'tokens.manage',
	'activity.read',
	'boundaries.upload',
	'boundaries.mend',
	'findings.accept',
	'sheet.read',
	'borders.edit',
	'colours.edit',
	'palette.edit',
	'palette.approve',
	'theme.edit',
	'layout.edit',
	'sheet.delete',
	'edition.issue',
	'files.download',
	'measures.read',
	'measures.edit',
	'territories.edit',
	'handover.edit',
	'handover.approve',
] as const;
export type Action = (typeof actions)[number];

const everyone: readonly Role[] = roles;

/** The one table of who may do what. */
export const may: Record<Action, readonly Role[]> = {
	'team.read': everyone,
	'team.manage': ['admin'],
	'members.manage': ['admin'],
	'tokens.manage': ['admin'],
	'activity.read': ['admin', 'approver'],
	'boundaries.upload': ['cartographer', 'admin'],
	// changes what a sheet stands on, and with it locks, territories and figures of others: whoever may bring a
	// file may propose new boundaries, but only a cartographer mends, confirms and puts back
	'boundaries.mend': ['cartographer'],
	'findings.accept': ['cartographer'],
	'sheet.read': everyone,
	'borders.edit': ['cartographer'],
	'colours.edit': ['cartographer', 'analyst'],
	'palette.edit': ['cartographer', 'analyst', 'designer'],
	'palette.approve': ['approver', 'admin'],
	'theme.edit': ['cartographer', 'analyst'],
	'layout.edit': ['cartographer', 'designer'],
	'sheet.delete': ['cartographer', 'admin'],
	'edition.issue': ['approver'],
	'files.download': everyone,
	// figures may be personal or confidential, and a designer's work needs none of them
	'measures.read': ['cartographer', 'analyst', 'planner', 'approver', 'admin'],
	'measures.edit': ['analyst', 'planner'],
	'territories.edit': ['planner'],
	'handover.edit': ['planner'],
	'handover.approve': ['approver'],
};

/** Whether any of these roles may do this. */
export const allows = (held: readonly Role[], action: Action): boolean =>
	held.some((role) => may[action].includes(role));
