import { readingFields } from '../upload.ts';
import type { Operation } from './operations.ts';
import * as recuts from './recuts.ts';

const all = '/sheets/{sheet}/recuts';
const one = `${all}/{recut}`;

/** The routes by which a sheet is given other boundaries. */
export const recutOperations = {
	listRecuts: {
		...{ method: 'GET', path: all, scope: 'sheets:read', status: 200 },
		...{ summary: 'Changes of a sheet’s boundaries, the newest first.', answer: recuts.recutList },
	},
	beginRecut: {
		...{ method: 'POST', path: all, scope: 'sheets:write', status: 202 },
		summary: 'Upload other boundaries for a sheet; follow the number that is answered.',
		...{ form: readingFields, answer: recuts.recutBegun, refusals: [409, 413, 415, 422] },
	},
	readRecut: {
		...{ method: 'GET', path: one, scope: 'sheets:read', status: 200 },
		summary: 'How far it is; which regions go on as which, which borders change, what follows.',
		answer: recuts.recutDetail,
	},
	applyRecut: {
		...{ method: 'POST', path: `${one}/apply`, scope: 'sheets:write', status: 200 },
		summary: 'Give the sheet these boundaries; draft, territories and figures follow.',
		...{
			json: recuts.recutApplying,
			answer: recuts.recutDone,
			refusals: [409, 413, 415, 422, 503],
		},
	},
	putBackRecut: {
		...{ method: 'POST', path: `${one}/put-back`, scope: 'sheets:write', status: 200 },
		summary: 'Give the sheet the boundaries back that it had before.',
		...{ json: recuts.recutPuttingBack, answer: recuts.recutDone, refusals: [409, 413, 415, 422] },
	},
	dropRecut: {
		...{ method: 'POST', path: `${one}/drop`, scope: 'sheets:write', status: 200 },
		...{ summary: 'Drop one that is not applied.', answer: recuts.recutEnded, refusals: [409] },
	},
} satisfies Record<string, Operation>;
