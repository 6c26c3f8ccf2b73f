import { z } from 'zod';
import { exportKinds } from '../../engines/exports/kinds.ts';
import { readers } from '../../engines/palettes/palette.ts';
import { askExport, exportStates } from '../export.ts';
import { moment } from './common.ts';
import type { Operation } from './operations.ts';

const path = '/sheets/{sheet}/exports';

const note = z.strictObject({
	number: z.int(),
	state: z.enum(exportStates).describe('done: the file is there'),
	kind: askExport.shape.kind,
	edition: z.int().nullable().describe('null: of a draft'),
	revision: z.int().describe('the draft, or the one that was issued'),
	reader: z.enum(readers),
	options: z.record(z.string(), z.unknown()).describe('each option of the kind, as it was made'),
	step: z.string().describe('what is being done'),
	share: z.number(),
	sentence: z.string().describe('why there is no file, or what whoever takes it should know'),
	file: z
		.strictObject({
			name: z.string(),
			mediaType: z.string(),
			bytes: z.int(),
			digest: z.string().describe('SHA-256 of the bytes, hex'),
		})
		.nullable(),
	createdAt: moment,
	createdBy: z.string().nullable(),
	updatedAt: moment,
	expiresAt: moment.nullable().describe('when the file is dropped; null: kept with the edition'),
});

const mediaTypes = [...new Set(exportKinds.map(({ mediaType }) => mediaType.split(';')[0]))];

/** The routes by which files are taken of an edition or of the draft. */
export const exportOperations = {
	listExports: {
		...{ method: 'GET', path, scope: 'editions:read', status: 200 },
		summary: 'Files that were asked for of a sheet’s editions and drafts, the newest first.',
		answer: z.strictObject({ exports: z.array(note) }),
	},
	askExport: {
		...{ method: 'POST', path, scope: 'editions:read', status: 202 },
		summary:
			'Ask for a file of an edition or of the draft. The same request is answered with the same file; follow it until it is done.',
		...{ json: askExport, answer: note, refusals: [409, 413, 415, 422, 503] },
	},
	readExport: {
		...{ method: 'GET', path: `${path}/{export}`, scope: 'editions:read', status: 200 },
		...{ summary: 'How far a file is.', answer: note },
	},
	readExportFile: {
		...{ method: 'GET', path: `${path}/{export}/file`, scope: 'editions:read', status: 200 },
		summary: 'The file, once it is done.',
		...{ answer: mediaTypes, refusals: [409, 503] },
	},
} satisfies Record<string, Operation>;
