import { describe, expect, it, vi } from 'vitest';
import { saveFirst } from './save-first';

const draft = (after: { dirty: boolean; stale: null | object }) => ({
	...{ dirty: true, stale: null as never },
	async saveNow() {
		Object.assign(this, after);
	},
});

describe('a form that takes what was saved last', () => {
	it('is sent once the draft is saved', async () => {
		const [tell, cancel] = [vi.fn(), vi.fn()];
		const desk = { draft: draft({ dirty: false, stale: null }) };
		expect(await saveFirst(desk, tell)({ cancel })).toBe(true);
		expect(cancel).not.toHaveBeenCalled();
		expect(tell.mock.calls).toEqual([['']]);
	});

	it.each([
		['no answer came', { dirty: true, stale: null }],
		['somebody else saved first', { dirty: false, stale: {} }],
	])('is not sent, and says so, where %s', async (_, after) => {
		const [tell, cancel] = [vi.fn(), vi.fn()];
		expect(await saveFirst({ draft: draft(after) }, tell)({ cancel })).toBe(false);
		expect(cancel).toHaveBeenCalledOnce();
		expect(tell).toHaveBeenLastCalledWith(expect.stringContaining('not saved yet'));
	});
});
