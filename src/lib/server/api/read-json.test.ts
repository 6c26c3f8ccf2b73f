import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { ApiFault } from './fault.ts';
import { parseJson } from './read-json.ts';

const bytes = (text: string) => new TextEncoder().encode(text);
const refusal = (text: string) => {
	try {
		parseJson(bytes(text), z.unknown());
	} catch (fault) {
		return fault;
	}
	return null;
};

describe('parseJson', () => {
	it('refuses what nests too deep before it is parsed, brackets in strings not counted', () => {
		expect(refusal('['.repeat(2_000_000))).toBeInstanceOf(ApiFault);
		expect(refusal(`${'['.repeat(65)}${']'.repeat(65)}`)).toBeInstanceOf(ApiFault);
		expect(refusal(`${'['.repeat(64)}${']'.repeat(64)}`)).toBeNull();
		expect(refusal(JSON.stringify({ a: '['.repeat(100), b: '\\"{{' }))).toBeNull();
	});

	it('refuses what is not JSON and what is not UTF-8', () => {
		expect(refusal('{')).toBeInstanceOf(ApiFault);
		expect(() => parseJson(Uint8Array.of(34, 0xff, 34), z.unknown())).toThrow(ApiFault);
	});
});
