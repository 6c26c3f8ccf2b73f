import { z } from 'zod';
import type { Scope } from '../../server/access/scopes.ts';
import { saveDraft } from '../draft.ts';
import { readingFields, uploadFields } from '../upload.ts';
import { boundariesResponse } from './check-boundaries.ts';
import { colouringRequest, colouringResponse } from './check-colouring.ts';
import { paletteRequest, paletteResponse } from './check-palette.ts';
import { proofRequest, proofResponse } from './check-proof.ts';
import { territoriesRequest, territoriesResponse } from './check-territories.ts';
import { exportOperations } from './export-operations.ts';
import * as handovers from './handovers.ts';
import * as measures from './measures.ts';
import { recutOperations } from './recut-operations.ts';
import { searchOperations } from './search-operations.ts';
import * as sheets from './sheets.ts';
import { territoryOperations } from './territory-operations.ts';

/** One route of the API: what it takes and gives. The API's description is made from this list. */
export interface Operation {
	method: 'GET' | 'POST' | 'PUT';
	/** below /api/v1, parameters in braces */
	path: string;
	scope: Scope;
	summary: string;
	json?: z.ZodType;
	/** media type of a body that is a text */
	text?: string;
	/** fields that come before the file */
	form?: z.ZodType;
	status: 200 | 202;
	/** a schema of the JSON answered, or the media types of a file */
	answer: z.ZodType | string[];
	/** statuses besides 400, 401, 403, 404, 405, 429 */
	refusals?: number[];
}

const sheet = '/sheets/{sheet}';

export const operations = {
	checkBoundaries: {
		...{ method: 'POST', path: '/check/boundaries', scope: 'boundaries:check', status: 200 },
		summary: 'Read a boundary file: regions, borders with metres, findings. Nothing is stored.',
		...{ form: readingFields, answer: boundariesResponse, refusals: [413, 415, 422, 503] },
	},
	checkColouring: {
		...{ method: 'POST', path: '/check/colouring', scope: 'colouring:check', status: 200 },
		summary: 'Colour regions with a proof, or explain why the rules cannot all be kept.',
		...{ json: colouringRequest, answer: colouringResponse, refusals: [413, 415, 503] },
	},
	checkPalette: {
		...{ method: 'POST', path: '/check/palette', scope: 'palette:check', status: 200 },
		summary: 'Check a palette for every reader, and mend it.',
		...{ json: paletteRequest, answer: paletteResponse, refusals: [413, 415, 503] },
	},
	checkProof: {
		...{ method: 'POST', path: '/check/proof', scope: 'colouring:check', status: 200 },
		summary: 'Check a proof file by the file alone: what it shows, and what it does not.',
		...{ json: proofRequest, answer: proofResponse, refusals: [413, 415, 503] },
	},
	checkTerritories: {
		...{ method: 'POST', path: '/check/territories', scope: 'territories:check', status: 200 },
		summary: 'Even out territories with few moves and a bound, or tell why it cannot be done.',
		...{ json: territoriesRequest, answer: territoriesResponse, refusals: [413, 415, 503] },
	},
	listSheets: {
		...{ method: 'GET', path: '/sheets', scope: 'sheets:read', status: 200 },
		...{ summary: 'The team’s sheets, the one saved last first.', answer: sheets.sheetList },
	},
	uploadSheet: {
		...{ method: 'POST', path: '/sheets', scope: 'sheets:write', status: 202 },
		summary: 'Upload a boundary file to become a sheet; follow the intake that is answered.',
		...{ form: uploadFields, answer: sheets.intake, refusals: [409, 413, 415, 422] },
	},
	readIntake: {
		...{ method: 'GET', path: '/intakes/{intake}', scope: 'sheets:read', status: 200 },
		...{ summary: 'How far an uploaded file is.', answer: sheets.intake },
	},
	answerIntake: {
		...{ method: 'POST', path: '/intakes/{intake}/answer', scope: 'sheets:write', status: 202 },
		summary: 'Answer what the file does not say; it is read on with the answer.',
		...{ json: sheets.answer, answer: sheets.intake, refusals: [409, 413, 415, 422] },
	},
	readSheet: {
		...{ method: 'GET', path: sheet, scope: 'sheets:read', status: 200 },
		...{ summary: 'A sheet: its regions, findings and editions.', answer: sheets.sheetDetail },
	},
	readBorders: {
		...{ method: 'GET', path: `${sheet}/borders`, scope: 'sheets:read', status: 200 },
		...{ summary: 'The borders that bind on a sheet.', answer: sheets.sheetBorders },
	},
	readBorderFile: {
		...{ method: 'GET', path: `${sheet}/borders/{file}`, scope: 'sheets:read', status: 200 },
		summary:
			'borders.csv: every pair with its standing and reasons; borders.col: the pairs that count, in the DIMACS form.',
		answer: ['text/csv', 'text/plain'],
		refusals: [503],
	},
	readColouring: {
		...{ method: 'GET', path: `${sheet}/colouring`, scope: 'sheets:read', status: 200 },
		...{
			summary: 'The colouring of the draft, or why there is none.',
			answer: sheets.sheetColouring,
		},
	},
	readProof: {
		...{ method: 'GET', path: `${sheet}/proof`, scope: 'sheets:read', status: 200 },
		summary:
			'The proof file of the draft’s colouring, or of its collision; ?revision= of an earlier draft, ?edition= of an edition.',
		...{ answer: proofRequest, refusals: [409, 503] },
	},
	readRules: {
		...{ method: 'GET', path: `${sheet}/rules`, scope: 'sheets:read', status: 200 },
		...{ summary: 'Everything people decided about a sheet.', answer: sheets.sheetRules },
	},
	saveRules: {
		...{ method: 'PUT', path: `${sheet}/rules`, scope: 'sheets:write', status: 200 },
		summary: 'Save decisions as the next revision; 409 when somebody else saved first.',
		...{ json: saveDraft, answer: sheets.rulesSaved, refusals: [409, 413, 415, 422] },
	},
	readRulesTable: {
		...{ method: 'GET', path: `${sheet}/rules.csv`, scope: 'sheets:read', status: 200 },
		summary:
			'The rules about inks as CSV, a line a rule: locks, forbidden and reserved inks, pairs and groups alike or apart.',
		...{ answer: ['text/csv'], refusals: [503] },
	},
	saveRulesTable: {
		...{ method: 'PUT', path: `${sheet}/rules.csv`, scope: 'sheets:write', status: 200 },
		summary:
			'Send such a table in place of the rules there; refused whole, with the rows, when any row makes no rule.',
		text: 'text/csv',
		...{ answer: sheets.rulesSaved, refusals: [409, 413, 415, 422, 503] },
	},
	listMeasures: {
		...{ method: 'GET', path: `${sheet}/measures`, scope: 'territories:read', status: 200 },
		...{ summary: 'The figures joined to a sheet’s regions.', answer: measures.measureList },
	},
	readMeasure: {
		method: 'GET',
		path: `${sheet}/measures/{measure}`,
		...{ scope: 'territories:read', status: 200 },
		summary: 'One measure by its name, with its value for each region.',
		answer: measures.measureDetail,
	},
	saveMeasure: {
		method: 'PUT',
		path: `${sheet}/measures/{measure}`,
		...{ scope: 'territories:write', status: 200 },
		summary: 'Send a measure by its name: new, in place of what is there, or on top of it.',
		json: measures.measureSent,
		...{ answer: measures.measureKept, refusals: [409, 413, 415, 422, 503] },
	},
	listHandovers: {
		...{ method: 'GET', path: `${sheet}/handovers`, scope: 'territories:read', status: 200 },
		...{ summary: 'Handover lists, the newest first.', answer: handovers.handoverList },
	},
	readHandover: {
		method: 'GET',
		path: `${sheet}/handovers/{handover}`,
		...{ scope: 'territories:read', status: 200 },
		summary: 'One handover list with its moves.',
		answer: handovers.handoverDetail,
	},
	...territoryOperations,
	...recutOperations,
	...searchOperations,
	...exportOperations,
	listEditions: {
		...{ method: 'GET', path: `${sheet}/editions`, scope: 'editions:read', status: 200 },
		...{ summary: 'Issued editions, the newest first.', answer: sheets.editionList },
	},
	readEdition: {
		...{ method: 'GET', path: `${sheet}/editions/{edition}`, scope: 'editions:read', status: 200 },
		...{ summary: 'One edition.', answer: sheets.edition },
	},
	readEditionFile: {
		method: 'GET',
		path: `${sheet}/editions/{edition}/files/{file}`,
		...{ scope: 'editions:read', status: 200 },
		summary: 'A file of an edition, byte for byte as it was issued.',
		answer: ['image/svg+xml', 'application/geo+json', 'text/csv'],
	},
} satisfies Record<string, Operation>;
