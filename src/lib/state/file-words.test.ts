import { describe, expect, it } from 'vitest';
import { exportKinds } from '../engines/exports/kinds.ts';
import { differsBy, isUsual, purposes } from './file-words.ts';

const svg = { kind: 'svg', reader: 'typical' } as const;

describe('words about files', () => {
	it('name every kind once', () => {
		const named = purposes.flatMap(({ kinds }) => kinds);
		expect([...named].sort()).toEqual(exportKinds.map(({ id }) => id).sort());
	});

	it('say only what is not as usual', () => {
		expect(isUsual({ ...svg, options: { colours: 'class', letters: 'embedded' } })).toBe(true);
		const other = { ...svg, options: { colours: 'attribute', letters: 'outlines' } };
		expect(differsBy(other)).toBe('colours on every region, letters as shapes');
		expect(isUsual(other)).toBe(false);
		const seen = { kind: 'png', reader: 'deutan', options: { dpi: 300, ground: 'white' } } as const;
		expect(differsBy(seen)).toBe('as a deutan reader sees it');
		const zip = { kind: 'zip', reader: 'typical' } as const;
		const usual = { kinds: ['csv', 'geojson', 'pdf', 'svg', 'tokens'] };
		expect(differsBy({ ...zip, options: usual })).toBe('');
		expect(differsBy({ ...zip, options: { kinds: ['css', 'csv'] } })).toBe('CSS, CSV');
	});
});
