/**
 * RFC 8785, JSON Canonicalization Scheme: the samples of sections 3.2.2 (values) and 3.2.3 (order of
 * members).
 */
import { describe, expect, it } from 'vitest';
import { canonicalJson } from '../../src/lib/engines/editions/index.ts';

describe('canonical JSON against RFC 8785', () => {
	it('writes the values of section 3.2.2', () => {
		const sample = JSON.parse(
			'{"numbers":[333333333.33333329,1E30,4.50,2e-3,0.000000000000000000000000001],' +
				'"string":"\\u20ac$\\u000F\\u000aA\'\\u0042\\u0022\\u005c\\\\\\"\\/","literals":[null,true,false]}',
		);
		expect(canonicalJson(sample)).toBe(
			'{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],' +
				'"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
		);
	});

	it('orders members as in section 3.2.3', () => {
		const sample = {
			'\u20ac': 'Euro Sign',
			'\r': 'Carriage Return',
			'\ufb33': 'Hebrew Letter Dalet With Dagesh',
			'1': 'One',
			'\ud83d\ude00': 'Emoji: Grinning Face',
			'\u0080': 'Control',
			'\u00f6': 'Latin Small Letter O With Diaeresis',
		};
		expect(Object.values(JSON.parse(canonicalJson(sample)))).toEqual([
			// `1` is an array index and so comes first again once it is parsed
			'One',
			'Carriage Return',
			'Control',
			'Latin Small Letter O With Diaeresis',
			'Euro Sign',
			'Emoji: Grinning Face',
			'Hebrew Letter Dalet With Dagesh',
		]);
		expect(canonicalJson(sample).indexOf('\\r')).toBeLessThan(canonicalJson(sample).indexOf('"1"'));
	});

	it('refuses what has no canonical form', () => {
		for (const value of [NaN, Infinity, '\ud800', undefined, new Date(0), () => 1, 1n]) {
			expect(() => canonicalJson(value)).toThrow(TypeError);
		}
	});
});
