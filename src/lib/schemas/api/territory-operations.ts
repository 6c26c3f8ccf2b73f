import { beginProposal, saveTerritories } from '../territories.ts';
import type { Operation } from './operations.ts';
import * as territories from './territories.ts';

const sheet = '/sheets/{sheet}';
const proposals = `${sheet}/proposals`;
const one = `${proposals}/{proposal}`;

/** The routes over the territories and proposals of a team's own sheets. */
export const territoryOperations = {
	readTerritories: {
		...{ method: 'GET', path: `${sheet}/territories`, scope: 'territories:read', status: 200 },
		...{ summary: 'The territories of a sheet.', answer: territories.territories },
	},
	saveTerritories: {
		...{ method: 'PUT', path: `${sheet}/territories`, scope: 'territories:write', status: 200 },
		summary: 'Save territories as the next revision; 409 when somebody else saved first.',
		...{ json: saveTerritories, answer: territories.territoriesSaved },
		refusals: [409, 413, 415, 422],
	},
	listProposals: {
		...{ method: 'GET', path: proposals, scope: 'territories:read', status: 200 },
		...{ summary: 'Proposals, the newest first.', answer: territories.proposalList },
	},
	askProposal: {
		...{ method: 'POST', path: proposals, scope: 'territories:write', status: 202 },
		summary: 'Ask for a proposal to even out the territories; follow the number that is answered.',
		...{ json: beginProposal, answer: territories.proposalAsked },
		refusals: [409, 413, 415, 422],
	},
	readProposal: {
		...{ method: 'GET', path: one, scope: 'territories:read', status: 200 },
		summary: 'A proposal: how far it is, its moves, deviations and bound, or why there is none.',
		answer: territories.proposalDetail,
	},
	adoptProposal: {
		...{ method: 'POST', path: `${one}/adopt`, scope: 'territories:write', status: 200 },
		summary: 'Make a proposal the sheet’s territories.',
		...{ json: territories.adoption, answer: territories.adopted },
		refusals: [409, 413, 415, 422],
	},
	cancelProposal: {
		...{ method: 'POST', path: `${one}/cancel`, scope: 'territories:write', status: 200 },
		summary: 'Stop a proposal that waits or is being worked out.',
		...{ answer: territories.proposalEnded, refusals: [409] },
	},
	dropProposal: {
		...{ method: 'POST', path: `${one}/drop`, scope: 'territories:write', status: 200 },
		summary: 'Take a proposal off the list.',
		...{ answer: territories.proposalEnded, refusals: [409] },
	},
} satisfies Record<string, Operation>;
