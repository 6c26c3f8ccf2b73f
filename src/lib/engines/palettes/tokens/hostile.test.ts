import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readDesignTokens } from './index.ts';

const refusal = (text: string, within?: string) => {
	const answer = readDesignTokens(text, within);
	return answer.status === 'refused' ? answer.message : expect.fail('it was read');
};
const red = '{"$type":"color","$value":{"colorSpace":"srgb","components":[1,0,0]}}';

describe('a file that is not what it should be', () => {
	it.each([
		['no JSON', 'red', /not JSON/],
		['comments, as the report has them in its examples', `{"a":${red}, // red\n}`, /Comments/],
		['a list', `[${red}]`, /not an object/],
		['nothing in it', '{}', /no colour/],
		['deep nesting', '{"a":'.repeat(10_000), /levels deep/],
		['a million characters', ' '.repeat(1_000_001), /million/],
		[
			'too many values',
			JSON.stringify({ a: Array.from({ length: 60_000 }, () => 0) }),
			/50000 values/,
		],
		['a prototype', '{"__proto__":{"a":1}}', /__proto__/],
		['an alias to itself', '{"a":{"$type":"color","$value":"{a}"}}', /a to a/],
		['an alias into nothing', '{"a":{"$type":"color","$value":"{b}"}}', /leads nowhere/],
		[
			'a reference to another file',
			'{"a":{"$type":"color","$ref":"file:///etc/passwd"}}',
			/leads nowhere/,
		],
		[
			'a colour of no space',
			'{"a":{"$type":"color","$value":{"colorSpace":"toString","components":[1,0,0]}}}',
			/not one of/,
		],
		[
			'a colour without numbers',
			'{"a":{"$type":"color","$value":{"colorSpace":"srgb","components":["1",0,0]}}}',
			/three numbers/,
		],
		[
			'a colour out of all bounds',
			'{"a":{"$type":"color","$value":{"colorSpace":"lab","components":[1e300,0,0]}}}',
			/bounds/,
		],
		[
			'full transparency',
			'{"a":{"$type":"color","$value":{"colorSpace":"srgb","components":[1,0,0],"alpha":0}}}',
			/transparent/,
		],
	])('is refused in words: %s', (_, text, words) => {
		expect(refusal(text)).toMatch(words);
	});

	it('that doubles itself by groups that extend each other is given up on', () => {
		const groups = Array.from({ length: 30 }, (_, i) =>
			i === 0
				? `"g0":{"x":${red}}`
				: `"g${i}":{"l":{"$extends":"{g${i - 1}}"},"r":{"$extends":"{g${i - 1}}"}}`,
		);
		expect(refusal(`{${groups.join()}}`)).toMatch(/50000|levels deep/);
	});

	it('says what is left out, type by type, and no more than can be read', () => {
		const tokens = Object.fromEntries(
			Array.from({ length: 30 }, (_, i) => [`t${i}`, { $type: `kind${i >> 1}`, $value: 1 }]),
		);
		const answer = readDesignTokens(
			JSON.stringify({ ...tokens, red: JSON.parse(red), x: { $value: 1 } }),
		);
		const notes = answer.status === 'read' ? answer.notes : expect.fail('refused');
		expect(notes[0]).toBe('2 tokens of type kind0 are no colours and are left out.');
		expect(notes).toHaveLength(13);
		expect(notes[12]).toBe('Tokens of 4 more types are left out.');
		const untyped = readDesignTokens(`{"red":${red},"x":{"$value":1}}`);
		expect(untyped).toMatchObject({ notes: ['1 token without a type is left out.'] });
	});

	it('names that programs know are names like others', () => {
		const answer = readDesignTokens(
			`{"constructor":{"toString":${red}},"b":{"$type":"color","$value":"{constructor.toString}"}}`,
		);
		expect(answer).toMatchObject({ status: 'read', inks: [{ name: 'toString', hex: '#ff0000' }] });
		expect(refusal('{"b":{"$type":"color","$value":"{constructor.name}"}}')).toMatch(
			/leads nowhere/,
		);
	});

	it('of more colours than a palette has is asked for one of its groups', () => {
		const many = (count: number) =>
			Object.fromEntries(Array.from({ length: count }, (_, i) => [`c${i}`, JSON.parse(red)]));
		const text = JSON.stringify({ one: many(40), two: many(40) });
		expect(readDesignTokens(text)).toMatchObject({ status: 'refused', groups: ['one', 'two'] });
		const one = readDesignTokens(text, 'one');
		expect(one.status === 'read' && one.inks.length).toBe(40);
		expect(refusal(text, 'three')).toContain('no group three');
	});

	it('never throws, whatever JSON it is', () => {
		const token = fc.record({ $type: fc.constantFrom('color', 'number'), $value: fc.jsonValue() });
		const file = fc.dictionary(fc.string(), fc.oneof(token, fc.jsonValue()));
		fc.assert(fc.property(file, (json) => void readDesignTokens(JSON.stringify(json))));
		fc.assert(fc.property(fc.string(), (text) => void readDesignTokens(text)));
	});
});
