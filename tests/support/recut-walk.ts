import { randomUUID } from 'node:crypto';
import type { Member } from '../../src/lib/server/access/member.ts';
import type { Action } from '../../src/lib/server/access/roles.ts';
import type { Workshop } from '../../src/lib/server/jobs/workshop.ts';
import { answerIntake } from '../../src/lib/server/services/intake-answer.service.ts';
import {
	forgetAnswer,
	rememberedAnswers,
} from '../../src/lib/server/services/reading-answers.service.ts';
import { applyRecut } from '../../src/lib/server/services/recut-apply.service.ts';
import {
	addMends,
	beginFileRecut,
	beginReading,
	takeBackMend,
} from '../../src/lib/server/services/recut-begin.service.ts';
import { decideRecut } from '../../src/lib/server/services/recut-decide.service.ts';
import { putBackRecut } from '../../src/lib/server/services/recut-put-back.service.ts';
import {
	answerRecut,
	cancelRecut,
	dropRecut,
	retryRecut,
} from '../../src/lib/server/services/recut-work.service.ts';
import {
	readRecut,
	readRecutPage,
	recutGeometry,
	recutStatus,
	sheetRecuts,
} from '../../src/lib/server/services/recuts.service.ts';

type Walk = Record<string, [Action, (member: Member) => Promise<unknown>]>;

const answer = { choice: '', typed: '', keyField: '', nameField: '' };
const form = () => new Request('http://localhost/', { method: 'POST', body: new FormData() });
const drop = { kind: 'drop', key: 'x' } as const;
const upload = 'boundaries.upload';
const mend = 'boundaries.mend';

/** The services of questions and re-cuts with the right that each needs, on a sheet that is not there unless one is named. */
export const walkOfRecuts = (shop: () => Workshop, sheet = 99): Walk => ({
	addMends: [mend, (member) => addMends(shop(), member, sheet, [drop])],
	answerIntake: [upload, (member) => answerIntake(shop(), member, randomUUID(), answer)],
	answerRecut: [upload, (member) => answerRecut(shop(), member, sheet, 1, answer)],
	applyRecut: [mend, (member) => applyRecut(shop(), member, sheet, 1)],
	beginFileRecut: [upload, (member) => beginFileRecut(shop(), member, sheet, form())],
	beginReading: [mend, (member) => beginReading(shop(), member, sheet, { mends: 'keep' })],
	cancelRecut: [upload, (member) => cancelRecut(shop(), member, sheet, 1)],
	decideRecut: [mend, (member) => decideRecut(shop(), member, sheet, 1, [])],
	dropRecut: [upload, (member) => dropRecut(shop(), member, sheet, 1)],
	forgetAnswer: [upload, (member) => forgetAnswer(shop(), member, 'crs', 'x')],
	putBackRecut: [mend, (member) => putBackRecut(shop(), member, sheet, 1, true)],
	readRecut: ['sheet.read', (member) => readRecut(shop(), member, sheet, 1)],
	readRecutPage: ['sheet.read', (member) => readRecutPage(shop(), member, sheet, 1)],
	recutGeometry: ['sheet.read', (member) => recutGeometry(shop(), member, sheet, 1, 'after')],
	recutStatus: ['sheet.read', (member) => recutStatus(shop(), member, sheet, 1)],
	rememberedAnswers: ['sheet.read', (member) => rememberedAnswers(shop(), member)],
	retryRecut: [upload, (member) => retryRecut(shop(), member, sheet, 1)],
	sheetRecuts: ['sheet.read', (member) => sheetRecuts(shop(), member, sheet)],
	takeBackMend: [mend, (member) => takeBackMend(shop(), member, sheet, drop)],
});
