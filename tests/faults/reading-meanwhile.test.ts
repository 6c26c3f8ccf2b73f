import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Member } from '../../src/lib/server/access/member.ts';
import { beginIntake, intakeStatus } from '../../src/lib/server/services/intake.service.ts';
import { runIntake } from '../../src/lib/server/jobs/intake.job.ts';
import { sheetList } from '../../src/lib/server/services/sheet.service.ts';
import { hostileFiles } from '../support/hostile-files.ts';
import {
	createMember,
	createWorkshop,
	uploadRequest,
	type TestWorkshop,
} from '../support/workshop.ts';

let shop: TestWorkshop;
let member: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	member = await createMember(shop.db, 'meanwhile', 'cartographer');
});
afterAll(() => shop.close());

const never = new AbortController().signal;

// those that take longest to refuse
const slow = ['quotation marks without end', 'a KML text without end', '60,000 holes in one ring'];

it.each(slow)(
	'while %s is read and refused, others are answered',
	async (name) => {
		const [make, code] = hostileFiles[name];
		const { id } = await beginIntake(shop, member, uploadRequest('hostile', await make()));
		let reading = true;
		const read = runIntake(shop, id, never).finally(() => (reading = false));
		let answered = 0;
		while (reading) {
			expect(await sheetList(shop, member)).toEqual([]);
			// an answer that came only because the reading had ended does not count
			if (reading) answered++;
		}
		await read;
		expect(answered).toBeGreaterThan(2);
		const { state, refusal } = await intakeStatus(shop, member, id);
		expect({ state, code: refusal?.code }).toEqual({ state: 'refused', code });
	},
	120_000,
);
