import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { firstWishes, noTerritories } from '../../src/lib/engines/territories/territory-draft.ts';
import {
	Forbidden,
	mayDo,
	requireAccess,
	type Member,
} from '../../src/lib/server/access/member.ts';
import { actions, allows, may, roles, type Action } from '../../src/lib/server/access/roles.ts';
import { readActivity } from '../../src/lib/server/services/activity.service.ts';
import { borderFile } from '../../src/lib/server/services/border-files.service.ts';
import { columnOfSheet } from '../../src/lib/server/services/column-values.service.ts';
import { sheetFirstPicture } from '../../src/lib/server/services/first-picture.service.ts';
import { measureSheetGaps } from '../../src/lib/server/services/gaps.service.ts';
import { replaceRulesByFile, rulesFile } from '../../src/lib/server/services/rules-csv.service.ts';
import { sheetProof } from '../../src/lib/server/services/proof.service.ts';
import { sheetTies, tieGround } from '../../src/lib/server/services/ties.service.ts';
import { askExport } from '../../src/lib/schemas/export.ts';
import { stopExport } from '../../src/lib/server/services/export-end.service.ts';
import {
	askForExport,
	deskExports,
	exportFileOf,
	readExport,
	sheetExports,
} from '../../src/lib/server/services/exports.service.ts';
import {
	beginSearch,
	readSearch,
	sheetSearches,
	stopSearch,
} from '../../src/lib/server/services/searches.service.ts';
import { sheetPieces } from '../../src/lib/server/services/pieces.service.ts';
import { sheetBordersAnswer } from '../../src/lib/server/services/check.service.ts';
import { readDraft, saveDraft, saveLayout } from '../../src/lib/server/services/draft.service.ts';
import { draftSvg } from '../../src/lib/server/services/drawing.service.ts';
import { editionInks, revisionInks } from '../../src/lib/server/services/earlier-inks.service.ts';
import {
	editionChanges,
	themedEditions,
} from '../../src/lib/server/services/edition-changes.service.ts';
import {
	editionFile,
	issueEdition,
	readEdition,
	sheetEditions,
} from '../../src/lib/server/services/edition.service.ts';
import {
	createHandover,
	handoverList,
	readHandover,
} from '../../src/lib/server/services/handover.service.ts';
import { endLetter, sendLetters } from '../../src/lib/server/services/handover-letters.service.ts';
import {
	approveHandover,
	changeMoveState,
	changeReason,
	confirmHandover,
	withdrawHandover,
} from '../../src/lib/server/services/handover-work.service.ts';
import { adoptProposal } from '../../src/lib/server/services/proposal-adopt.service.ts';
import {
	cancelProposal,
	dropProposal,
	duplicateProposal,
	renameProposal,
} from '../../src/lib/server/services/proposal-keep.service.ts';
import {
	editProposal,
	recheckProposal,
} from '../../src/lib/server/services/proposal-plan.service.ts';
import {
	beginProposal,
	listOfProposals,
	openProposal,
	proposalProgress,
	readProposal,
} from '../../src/lib/server/services/proposals.service.ts';
import {
	assignFromColumn,
	assignFromScratch,
	previewFromColumn,
} from '../../src/lib/server/services/territories-start.service.ts';
import {
	deskTerritories,
	saveTerritories,
} from '../../src/lib/server/services/territories.service.ts';
import {
	beginIntake,
	beginSampleIntake,
	cancelIntake,
	intakeStatus,
	listIntakes,
	retryIntake,
} from '../../src/lib/server/services/intake.service.ts';
import {
	invite,
	readInvitations,
	withdrawInvitation,
} from '../../src/lib/server/services/invitations.service.ts';
import {
	changeRoles,
	leaveTeam,
	readMembers,
	removeMember,
} from '../../src/lib/server/services/members.service.ts';
import {
	approvePalette,
	endPaletteApproval,
} from '../../src/lib/server/services/palette-approval.service.ts';
import {
	addPalette,
	changePalette,
	copyPalette,
	readPalette,
	removePalette,
	teamPalettes,
} from '../../src/lib/server/services/palette.service.ts';
import { feedMeasure, measureByName } from '../../src/lib/server/services/measure-feed.service.ts';
import {
	chooseColumns,
	chooseJoin,
	decideRows,
	readTableReview,
	sweepRows,
} from '../../src/lib/server/services/measure-review.service.ts';
import { takeTable } from '../../src/lib/server/services/measure-taking.service.ts';
import {
	dropMeasure,
	dropTable,
	joinAgain,
	rereadTable,
} from '../../src/lib/server/services/measure-upkeep.service.ts';
import { uploadTable } from '../../src/lib/server/services/measure-upload.service.ts';
import { themeMeasures } from '../../src/lib/server/services/theme-figures.service.ts';
import { deskMeasures, measureTables } from '../../src/lib/server/services/measures.service.ts';
import { sheetColumns, sheetForPage } from '../../src/lib/server/services/sheet-columns.service.ts';
import {
	acceptFinding,
	deskSheet,
	nameSheet,
	removeSheet,
	sheetGeometry,
	sheetList,
} from '../../src/lib/server/services/sheet.service.ts';
import { changeTeamName } from '../../src/lib/server/services/teams.service.ts';
import {
	createToken,
	readTokens,
	withdrawToken,
} from '../../src/lib/server/services/tokens.service.ts';
import { setAlike } from '../../src/lib/server/services/series.service.ts';
import {
	applyTemplate,
	keepTemplate,
	readTemplates,
	removeTemplate,
	renameTemplate,
	replaceTemplate,
} from '../../src/lib/server/services/templates.service.ts';
import { join, newTeam, openHouse } from '../support/house.ts';
import { walkOfRecuts } from '../support/recut-walk.ts';
import { servicesForMembers } from '../support/member-services.ts';
import { createWorkshop, type TestWorkshop } from '../support/workshop.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
let bench: TestWorkshop;
let shop: TestWorkshop;
beforeAll(async () => {
	house = await openHouse();
	bench = await createWorkshop();
	shop = { ...bench, db: house.db };
});
afterAll(async () => {
	await bench.close();
	await house.close();
});

const id = randomUUID();
const empty = () => new Request('http://localhost/', { method: 'POST', body: new FormData() });
const sent = { revision: 1 } as Parameters<typeof saveDraft>[3];
const pattern = { name: 'Walk', ratio: false, palette: false };
type Layout = Parameters<typeof saveLayout>[3];
const figures = { unit: '', values: { a: 1 }, mode: 'replace', confidential: true } as const;
const token = { name: 'Walk', scopes: [], days: 1 };

const source = { kind: 'attribute', name: 'x' } as const;
const edit = { revision: 0, moves: {} };
const scratch = { revision: 0, territories: 2, measure: null, seed: 1 };
const asked = { name: 'Walk', wishes: firstWishes };
const drawn = { revision: 0, document: noTerritories };
const yes = { revision: 0, outside: true };
const edits = 'territories.edit';
const reads = 'measures.read';

type Walk = Record<string, [Action, (member: Member) => Promise<unknown>]>;

const walkOfTerritories: Walk = {
	adoptProposal: [edits, (member) => adoptProposal(shop, member, 99, 1, yes)],
	assignFromColumn: [
		edits,
		(member) => assignFromColumn(shop, member, 99, { revision: 0, source }),
	],
	assignFromScratch: [edits, (member) => assignFromScratch(shop, member, 99, scratch)],
	beginProposal: [edits, (member) => beginProposal(shop, member, 99, asked)],
	cancelProposal: [edits, (member) => cancelProposal(shop, member, 99, 1)],
	deskTerritories: [reads, (member) => deskTerritories(shop, member, 99)],
	dropProposal: [edits, (member) => dropProposal(shop, member, 99, 1)],
	duplicateProposal: [edits, (member) => duplicateProposal(shop, member, 99, 1)],
	editProposal: [edits, (member) => editProposal(shop, member, 99, 1, edit)],
	listOfProposals: [reads, (member) => listOfProposals(shop, member, 99)],
	openProposal: [reads, (member) => openProposal(shop, member, 99, 1)],
	previewFromColumn: [edits, (member) => previewFromColumn(shop, member, 99, source)],
	proposalProgress: [reads, (member) => proposalProgress(shop, member, 99)],
	readProposal: [reads, (member) => readProposal(shop, member, 99, 1)],
	recheckProposal: [edits, (member) => recheckProposal(shop, member, 99, 1)],
	renameProposal: [edits, (member) => renameProposal(shop, member, 99, 1, 'Walked')],
	saveTerritories: [edits, (member) => saveTerritories(shop, member, 99, drawn)],
};

/** Every service that acts for a member, what it needs, and a call that touches nothing that exists. */
const walk: Walk = {
	...walkOfRecuts(() => shop),
	...walkOfTerritories,
	acceptFinding: ['findings.accept', (member) => acceptFinding(shop, member, 99, 1)],
	addPalette: [
		'palette.edit',
		(member) => addPalette(shop, member, { name: randomUUID(), inks: [] }),
	],
	beginIntake: ['boundaries.upload', (member) => beginIntake(shop, member, empty())],
	beginSampleIntake: [
		'boundaries.upload',
		(member) => beginSampleIntake(shop, member, 'no such folder'),
	],
	cancelIntake: ['boundaries.upload', (member) => cancelIntake(shop, member, id)],
	changeRoles: ['members.manage', (member) => changeRoles(member, id, ['designer'])],
	changeTeamName: ['team.manage', (member) => changeTeamName(member, 'Walked')],
	chooseColumns: [
		'measures.edit',
		(member) => chooseColumns(shop, member, 99, 1, { columns: [], existing: 'replace' }),
	],
	chooseJoin: [
		'measures.edit',
		(member) => chooseJoin(shop, member, 99, 1, { column: 0, by: 'key' }),
	],
	decideRows: ['measures.edit', (member) => decideRows(shop, member, 99, 1, [])],
	deskMeasures: ['measures.read', (member) => deskMeasures(shop, member, 99)],
	dropMeasure: ['measures.edit', (member) => dropMeasure(shop, member, 99, 1, id)],
	dropTable: ['measures.edit', (member) => dropTable(shop, member, 99, 1)],
	feedMeasure: ['measures.edit', (member) => feedMeasure(shop, member, 99, 'Walk', figures)],
	joinAgain: ['measures.edit', (member) => joinAgain(shop, member, 99, 1)],
	measureByName: ['measures.read', (member) => measureByName(shop, member, 99, 'Walk')],
	measureTables: ['measures.read', (member) => measureTables(shop, member, 99)],
	readTableReview: ['measures.read', (member) => readTableReview(shop, member, 99, 1)],
	rereadTable: ['measures.edit', (member) => rereadTable(shop, member, 99, 1, {})],
	sweepRows: ['measures.edit', (member) => sweepRows(shop, member, 99, 1, { what: 'take-first' })],
	takeTable: ['measures.edit', (member) => takeTable(shop, member, 99, 1, true)],
	themeMeasures: ['sheet.read', (member) => themeMeasures(shop, member, 99)],
	uploadTable: ['measures.edit', (member) => uploadTable(shop, member, 99, empty())],
	createToken: ['tokens.manage', (member) => createToken(member, token)],
	approveHandover: [
		'handover.approve',
		(member) => approveHandover(shop, member, 99, 1, 'f'.repeat(64)),
	],
	changeMoveState: [
		'handover.edit',
		(member) => changeMoveState(shop, member, 99, 1, { move: 1, state: 'accepted', word: '' }),
	],
	changeReason: [
		'handover.edit',
		(member) => changeReason(shop, member, 99, 1, { move: 1, reason: 'Walked' }),
	],
	confirmHandover: ['handover.edit', (member) => confirmHandover(shop, member, 99, 1)],
	createHandover: [
		'handover.edit',
		(member) =>
			createHandover(shop, member, 99, { proposal: 1, effectiveOn: '2099-01-01', note: '' }),
	],
	endLetter: ['handover.edit', (member) => endLetter(shop, member, 99, 1, 'T01')],
	handoverList: ['measures.read', (member) => handoverList(shop, member, 99)],
	readHandover: ['measures.read', (member) => readHandover(shop, member, 99, 1)],
	sendLetters: ['handover.edit', (member) => sendLetters(shop, member, 99, 1, { press: id })],
	withdrawHandover: ['handover.edit', (member) => withdrawHandover(shop, member, 99, 1)],
	deskSheet: ['sheet.read', (member) => deskSheet(shop, member, 99)],
	sheetColumns: ['sheet.read', (member) => sheetColumns(shop, member, 99)],
	sheetForPage: ['sheet.read', (member) => sheetForPage(shop, member, 99)],
	draftSvg: ['sheet.read', (member) => draftSvg(shop, member, 99, 'typical')],
	editionFile: ['files.download', (member) => editionFile(shop, member, 99, 1, 'sheet.svg')],
	intakeStatus: ['sheet.read', (member) => intakeStatus(shop, member, id)],
	invite: [
		'members.manage',
		(member) => invite(member, 'Walk', `${randomUUID()}@x.example`, ['planner']),
	],
	issueEdition: ['edition.issue', (member) => issueEdition(shop, member, 99, 1, '')],
	leaveTeam: ['team.read', (member) => leaveTeam(member)],
	listIntakes: ['sheet.read', (member) => listIntakes(shop, member)],
	nameSheet: ['layout.edit', (member) => nameSheet(shop, member, 99, 'Walked')],
	readActivity: [
		'activity.read',
		(member) => readActivity(member, { kind: null, userId: null }, 1),
	],
	readDraft: ['sheet.read', (member) => readDraft(shop, member, 99, 1)],
	editionInks: ['sheet.read', (member) => editionInks(shop, member, 99, 1)],
	editionChanges: ['sheet.read', (member) => editionChanges(shop, member, 99, 1)],
	themedEditions: ['sheet.read', (member) => themedEditions(shop, member, 99)],
	revisionInks: ['sheet.read', (member) => revisionInks(shop, member, 99, 1)],
	readEdition: ['sheet.read', (member) => readEdition(shop, member, 99, 1)],
	readInvitations: ['members.manage', (member) => readInvitations(member)],
	readMembers: ['team.read', (member) => readMembers(member)],
	readTokens: ['tokens.manage', (member) => readTokens(member)],
	removeMember: ['members.manage', (member) => removeMember(member, id)],
	removePalette: ['palette.edit', (member) => removePalette(shop, member, id)],
	readPalette: ['sheet.read', (member) => readPalette(shop, member, id)],
	copyPalette: ['palette.edit', (member) => copyPalette(shop, member, id)],
	readTemplates: ['sheet.read', (member) => readTemplates(shop, member)],
	keepTemplate: ['layout.edit', (member) => keepTemplate(shop, member, 99, pattern)],
	replaceTemplate: [
		'layout.edit',
		(member) => replaceTemplate(shop, member, 99, { id, revision: 1, ...pattern }),
	],
	renameTemplate: [
		'layout.edit',
		(member) => renameTemplate(shop, member, { id, revision: 1, name: 'Walked' }),
	],
	removeTemplate: ['layout.edit', (member) => removeTemplate(shop, member, id)],
	applyTemplate: ['layout.edit', (member) => applyTemplate(shop, member, 99, { id, revision: 1 })],
	setAlike: ['layout.edit', (member) => setAlike(shop, member, { id, sheets: [] })],
	changePalette: [
		'palette.edit',
		(member) => changePalette(shop, member, id, { name: 'Walked', inks: [], revision: 1 }),
	],
	approvePalette: ['palette.approve', (member) => approvePalette(shop, member, id, 'f'.repeat(64))],
	endPaletteApproval: ['palette.approve', (member) => endPaletteApproval(shop, member, id)],
	removeSheet: ['sheet.delete', (member) => removeSheet(shop, member, 99)],
	retryIntake: ['boundaries.upload', (member) => retryIntake(shop, member, id)],
	saveDraft: ['sheet.read', (member) => saveDraft(shop, member, 99, sent)],
	saveLayout: ['layout.edit', (member) => saveLayout(shop, member, 99, {} as Layout)],
	sheetBordersAnswer: [
		'sheet.read',
		(member) => sheetBordersAnswer(shop, member, 99, new AbortController().signal),
	],
	borderFile: [
		'sheet.read',
		(member) => borderFile(shop, member, 99, 'csv', new AbortController().signal),
	],
	sheetProof: [
		'sheet.read',
		(member) => {
			const asked = { format: 'json' } as const;
			return sheetProof(shop, member, 99, asked, new AbortController().signal);
		},
	],
	measureSheetGaps: ['borders.edit', (member) => measureSheetGaps(shop, member, 99, 10)],
	columnOfSheet: ['sheet.read', (member) => columnOfSheet(shop, member, 99, 'name')],
	rulesFile: ['sheet.read', (member) => rulesFile(shop, member, 99, new AbortController().signal)],
	replaceRulesByFile: [
		'colours.edit',
		(member) =>
			replaceRulesByFile(shop, member, 99, new Uint8Array(), new AbortController().signal),
	],
	sheetPieces: ['sheet.read', (member) => sheetPieces(shop, member, 99)],
	beginSearch: ['colours.edit', (member) => beginSearch(shop, member, 99, { times: 1 })],
	stopSearch: ['colours.edit', (member) => stopSearch(shop, member, 99, 1)],
	sheetTies: ['sheet.read', (member) => sheetTies(shop, member, 99)],
	tieGround: ['sheet.read', (member) => tieGround(shop, member, 99, { sheet: 98, within: 1 })],
	askForExport: [
		'files.download',
		(member) => askForExport(shop, member, 99, askExport.parse({ kind: 'svg' })),
	],
	sheetExports: ['files.download', (member) => sheetExports(shop, member, 99)],
	readExport: ['files.download', (member) => readExport(shop, member, 99, 1)],
	deskExports: ['files.download', (member) => deskExports(shop, member, 99)],
	exportFileOf: ['files.download', (member) => exportFileOf(shop, member, 99, 1)],
	stopExport: ['files.download', (member) => stopExport(shop, member, 99, 1)],
	sheetSearches: ['sheet.read', (member) => sheetSearches(shop, member, 99)],
	readSearch: ['sheet.read', (member) => readSearch(shop, member, 99, 1)],
	sheetEditions: ['sheet.read', (member) => sheetEditions(shop, member, 99)],
	sheetFirstPicture: ['sheet.read', (member) => sheetFirstPicture(shop, member, 99, 'tag')],
	sheetGeometry: ['sheet.read', (member) => sheetGeometry(shop, member, 99)],
	sheetList: ['sheet.read', (member) => sheetList(shop, member)],
	teamPalettes: ['sheet.read', (member) => teamPalettes(shop, member)],
	withdrawInvitation: ['members.manage', (member) => withdrawInvitation(member, id)],
	withdrawToken: ['tokens.manage', (member) => withdrawToken(member, id)],
};
/** They only look up, for services that have asked already, or tell what a member may do. */
const lookUps = ['intakeOf', 'rightsOf', 'sheetOf'];

const isForbidden = (work: Promise<unknown>): Promise<boolean> =>
	work.then(
		() => false,
		(problem: unknown) => problem instanceof Forbidden,
	);

describe('what each role may do', () => {
	it('is walked for every service that acts for a member', () => {
		expect([...Object.keys(walk), ...lookUps].sort()).toEqual(servicesForMembers());
	});

	describe.each(roles)('%s', (role) => {
		let member: Member;
		beforeAll(async () => {
			member = await join(house.db, (await newTeam(house.db)).team, role);
		});
		it.each(Object.entries(walk))('%s', async (_name, [action, call]) => {
			expect(await isForbidden(call(member))).toBe(!allows([role], action));
		});
	});

	it('is closed to a token without scopes', async () => {
		const { team } = await newTeam(house.db);
		const member: Member = { team, userId: null, tokenId: id, roles: [], actions: [] };
		for (const [name, [, call]] of Object.entries(walk)) {
			expect(await isForbidden(call(member)), name).toBe(true);
		}
	});
});

describe('the table of roles', () => {
	it('names somebody for every action, and only roles that exist', () => {
		for (const action of actions) {
			expect(may[action].length, action).toBeGreaterThan(0);
			for (const role of may[action]) expect(roles).toContain(role);
		}
	});

	it('gives members, tokens and the team itself to the admin alone', () => {
		const kept = actions.filter((action) => action.endsWith('.manage'));
		expect(kept).toHaveLength(3);
		for (const action of kept) expect(may[action]).toEqual(['admin']);
	});

	it('adds up for those who hold several roles', () => {
		const team = { id, slug: 'walk', name: 'Walk' };
		const member: Member = {
			...{ team, userId: id, tokenId: null },
			roles: ['analyst', 'approver'],
			actions: null,
		};
		expect(mayDo(member, 'colours.edit') && mayDo(member, 'edition.issue')).toBe(true);
		expect(() => requireAccess(member, 'members.manage')).toThrow(Forbidden);
	});
});
