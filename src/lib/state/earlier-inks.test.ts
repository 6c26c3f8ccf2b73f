import { describe, expect, it } from 'vitest';
import { compareInks, inksByRegion, readEarlier } from './earlier-inks';

describe('earlier inks', () => {
	const earlier = { a: 0, b: 1, c: 2, x: 3 };

	it('are compared by key: what changed, what is new, what is gone', () => {
		expect(compareInks(earlier, ['b', 'n', 'a', 'c'], [1, 0, 3, 2])).toEqual({
			changes: [{ region: 2, before: 0, after: 3 }],
			both: 3,
			fresh: [1],
			gone: ['x'],
		});
	});

	it('are -1 for a region that did not exist then, whatever its key is', () => {
		expect([...inksByRegion(earlier, ['c', 'toString', 'a'])]).toEqual([2, -1, 0]);
	});

	it('are asked of the edition or the revision, and every refusal is a sentence', async () => {
		const asked: string[] = [];
		const answer = (status: number) => async (address: RequestInfo | URL) => {
			asked.push(String(address));
			return Response.json({ inks: earlier }, { status });
		};
		expect(await readEarlier('/t/sheets/1', { edition: 2 }, answer(200))).toEqual(earlier);
		await readEarlier('/t/sheets/1', { revision: 7 }, answer(200));
		expect(asked).toEqual(['/t/sheets/1/editions/2/inks', '/t/sheets/1/drafts/7/inks']);
		const gone = readEarlier('/t/sheets/1', { revision: 7 }, answer(404));
		await expect(gone).rejects.toThrow('There is no colouring in revision 7 of the draft.');
		const away = () => Promise.reject(new TypeError('offline'));
		await expect(readEarlier('', { edition: 1 }, away)).rejects.toThrow('cannot be reached');
	});
});
