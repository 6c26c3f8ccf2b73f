import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { placeOnThisSite } from './place.ts';

const origin = 'https://maps.example';

describe('where a form may send people back to', () => {
	it.each(['/survey/sheets', '/survey/members?x=1&y=2', '/'])('keeps %s', (place) => {
		expect(placeOnThisSite(place)).toBe(place);
	});

	it.each([
		...['//evil.example', '/\\evil.example', '\\\\evil.example', 'https://evil.example/'],
		...[
			'javascript:alert(1)',
			'survey',
			'',
			null,
			undefined,
			7,
			'/\t/evil.example',
			'/.//evil.example',
			'/x/..//evil.example',
		],
	])('sends %s to the fallback', (place) => {
		expect(placeOnThisSite(place)).toBe('/teams');
	});

	it('never leaves the site, as a browser reads the address', () => {
		fc.assert(
			fc.property(
				fc.oneof(
					fc.webUrl(),
					fc.string(),
					fc.string().map((s) => `/${s}`),
				),
				(place) => {
					expect(new URL(placeOnThisSite(place), origin).origin).toBe(origin);
				},
			),
		);
	});
});
