import { describe, expect, it } from 'vitest';
import { rebasePlan, savePlanTo } from './save-plan';

const rebase = rebasePlan((region) => `region ${region}`);

describe('two people edit one plan', () => {
	it('keeps my moves where I made them and theirs elsewhere', () => {
		const { draft, both } = rebase([0, 0, 1, 1], [0, 1, 1, 1], [0, 0, 1, 0]);
		expect(draft).toEqual([0, 1, 1, 0]);
		expect(both).toEqual([]);
	});

	it('names the regions that both moved, each to another territory', () => {
		const { draft, both } = rebase([0, 0, 0], [1, 1, 0], [2, 1, 2]);
		expect(draft).toEqual([1, 1, 2]);
		expect(both).toEqual(['region 0']);
	});
});

describe('saving a plan', () => {
	const answering = (status: number, body: unknown): typeof fetch =>
		(async () => new Response(JSON.stringify(body), { status })) as typeof fetch;

	it('hands on what the server judged', async () => {
		const saved = { revision: 4, assignment: [1], note: {}, inks: { n: 2 }, changedInks: ['n'] };
		const answer = await savePlanTo('/plan', answering(200, saved))(3, [1]);
		expect(answer).toMatchObject({
			kind: 'saved',
			saved: { revision: 4, inks: { n: 2 }, changedInks: ['n'] },
		});
	});

	it('hands on their plan when somebody else was first', async () => {
		const answer = await savePlanTo('/plan', answering(409, { revision: 9, assignment: [0] }))(
			3,
			[1],
		);
		expect(answer).toMatchObject({ kind: 'stale', stale: { revision: 9, document: [0] } });
	});

	it('takes another conflict for a refusal with its reason', async () => {
		const refused = answering(409, { message: 'It was adopted already.' });
		expect(await savePlanTo('/plan', refused)(3, [1])).toEqual({
			kind: 'refused',
			message: 'It was adopted already.',
		});
	});
});
