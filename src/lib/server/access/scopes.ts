import type { Action } from './roles.ts';

/** What an API token may be given. */
export const scopes = [
	'boundaries:check',
	'colouring:check',
	'palette:check',
	'territories:check',
	'sheets:read',
	'sheets:write',
	'editions:read',
	'territories:read',
	'territories:write',
] as const;
export type Scope = (typeof scopes)[number];

export const scopeWords: Record<Scope, string> = {
	'boundaries:check': 'Check boundary files without storing them',
	'colouring:check': 'Compute colourings without storing them',
	'palette:check': 'Check palettes without storing them',
	'territories:check': 'Even out territories without storing them',
	'sheets:read': 'Read sheets and their colourings',
	'sheets:write': 'Upload boundaries and change sheets',
	'editions:read': 'Read editions and download their files',
	'territories:read': 'Read measures, territories, proposals and handover lists',
	'territories:write': 'Upload measures, change territories, ask for proposals',
};

/** The checks touch nothing of the team, so they need the scope alone and no action. */
const actionsOfScope: Record<Scope, readonly Action[]> = {
	'boundaries:check': [],
	'colouring:check': [],
	'palette:check': [],
	'territories:check': [],
	'sheets:read': ['team.read', 'sheet.read'],
	'sheets:write': [
		...(['team.read', 'sheet.read', 'boundaries.upload', 'boundaries.mend'] as const),
		'findings.accept',
		...(['borders.edit', 'colours.edit', 'palette.edit', 'layout.edit'] as const),
	],
	'editions:read': ['team.read', 'sheet.read', 'files.download'],
	'territories:read': ['team.read', 'sheet.read', 'measures.read'],
	'territories:write': [
		...(['team.read', 'sheet.read', 'measures.read', 'measures.edit'] as const),
		'territories.edit',
	],
};

/** Every action that these scopes together allow. */
export const actionsOf = (held: readonly Scope[]): Action[] => [
	...new Set(held.flatMap((scope) => actionsOfScope[scope])),
];
