import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Desk } from './desk.svelte';
import { NameHand } from './name-hand.svelte';

const desk = { address: '/team/sheets/1', sheet: { regions: { key: ['a', 'b'] } } };
const hand = () => new NameHand(desk as unknown as Desk);

/** What the server answers, one after another. */
function answers(...bodies: (string | null)[]) {
	const fetcher = vi.fn(async (_address: string) => {
		const body = bodies.shift() ?? null;
		if (body === null) throw new TypeError('torn');
		return new Response(body);
	});
	vi.stubGlobal('fetch', fetcher);
	return fetcher;
}
afterEach(() => vi.unstubAllGlobals());

const column = JSON.stringify({ boundarySet: 's', values: ['Ay', null] });

describe('names from a column', () => {
	it('are fetched once for as long as the column stays', async () => {
		const fetcher = answers(column);
		const names = hand();
		await names.takeFrom('name & more');
		await names.takeFrom('name & more');
		expect(fetcher.mock.calls).toEqual([['/team/sheets/1/column?name=name%20%26%20more']]);
		expect(names).toMatchObject({ named: ['Ay', null], trouble: '' });
		await names.takeFrom(null);
		expect(names).toMatchObject({ named: null, trouble: '' });
	});

	it.each([
		['nothing comes', null],
		['a page comes in their place', '<!doctype html>'],
		['they are of other boundaries', '{"boundarySet":"t","values":["Ay"]}'],
		['something else comes', '[]'],
	])('are the sheet’s own, and can be tried again, when %s', async (_, body) => {
		answers(body, column);
		const names = hand();
		await names.takeFrom('name');
		expect(names.named).toBeNull();
		expect(names.trouble).toContain('The column name could not be fetched');
		await names.tryAgain();
		expect(names).toMatchObject({ named: ['Ay', null], trouble: '' });
	});

	it('of a column that was left meanwhile count no more', async () => {
		const late: ((response: Response) => void)[] = [];
		vi.stubGlobal('fetch', () => new Promise<Response>((resolve) => late.push(resolve)));
		const names = hand();
		const first = names.takeFrom('first');
		const second = names.takeFrom('second');
		late[1](new Response(column));
		await second;
		late[0](new Response('<!doctype html>'));
		await first;
		expect(names).toMatchObject({ named: ['Ay', null], trouble: '' });
	});
});
