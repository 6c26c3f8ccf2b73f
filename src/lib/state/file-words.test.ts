import { describe, expect, it } from 'vitest';
import { exportKinds } from '../engines/exports/kinds.ts';
import type { ExportNote } from '../schemas/export.ts';
import { differsBy, earlierFiles, filesOf, isUsual, purposes } from './file-words.ts';

const svg = { kind: 'svg', reader: 'typical' } as const;

describe('words about files', () => {
	it('name every kind once', () => {
		const named = purposes.flatMap(({ kinds }) => kinds);
		expect([...named].sort()).toEqual(exportKinds.map(({ id }) => id).sort());
	});

	const note = (number: number, state: ExportNote['state'], kind: 'pdf' | 'css'): ExportNote => ({
		...{ number, state, kind, edition: 2, revision: 9, reader: 'typical', options: {} },
		...{ step: '', share: 0, sentence: '', file: null, createdBy: null, expiresAt: null },
		...{ createdAt: '', updatedAt: '' },
	});

	it('are about the files that are still of interest', () => {
		const all = [
			...[note(4, 'failed', 'css'), note(3, 'done', 'pdf')],
			...[note(2, 'failed', 'pdf'), note(1, 'cancelled', 'css')],
		];
		expect(filesOf(all, 2, 9).map(({ number }) => number)).toEqual([4, 3]);
		expect(filesOf(all, null, 9)).toEqual([]);
	});

	it('lose none of an earlier draft that is kept or on its way', () => {
		const file = { name: 'a.css', mediaType: 'text/css', bytes: 1, digest: '' };
		const draft = (one: ExportNote, revision = 8) => ({ ...one, edition: null, revision });
		const all = [
			...[draft(note(6, 'running', 'css'), 9), draft(note(5, 'running', 'pdf'))],
			...[{ ...draft(note(4, 'done', 'css')), file }, draft(note(3, 'failed', 'css'))],
			...[draft(note(2, 'cancelled', 'css')), { ...note(1, 'done', 'pdf'), file }],
		];
		expect(earlierFiles(all, 9).map(({ number }) => number)).toEqual([5, 4]);
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
