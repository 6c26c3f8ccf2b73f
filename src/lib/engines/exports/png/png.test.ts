import { PNG } from 'pngjs';
import { describe, expect, it } from 'vitest';
import { sourceOf } from '../../../../../tests/support/export-source.ts';
import { chunksOf } from '../../../../../tests/support/png-chunks.ts';
import { layout, statesCoverage } from '../../../../../tests/support/sheets.ts';
import { rasterise } from '../../../server/jobs/rasterise.ts';
import { exportFile, pixelLimit, pixelsOf, type ExportOptions } from '../index.ts';
import { withPixelSize } from './about-pixels.ts';

const made = async (options: Partial<ExportOptions['png']>) => {
	const outcome = await exportFile('png', sourceOf(), options, { rasterise });
	if (outcome.status === 'refused') throw new Error(outcome.message);
	return outcome.file.bytes;
};

describe('PNG, decoded by pngjs 7.0.0', () => {
	it('has the pixels of the paper and tells their size', async () => {
		const bytes = await made({ dpi: 100 });
		const picture = PNG.sync.read(Buffer.from(bytes));
		// A4 is 297 by 210 mm (ISO 216), an inch 25.4 mm
		expect([picture.width, picture.height]).toEqual([1169, 827]);
		const chunks = chunksOf(bytes);
		// third edition, 11.3.4.3: pixels a metre; 100 / 0.0254 = 3937.008
		const size = chunks.find(({ type }) => type === 'pHYs')!.data;
		expect([size.readUInt32BE(0), size.readUInt32BE(4), size[8]]).toEqual([3937, 3937, 1]);
		// 5.6: sRGB and pHYs before IDAT, and 11.3.2.5: one byte of rendering intent
		const order = chunks.map(({ type }) => type);
		expect(order.slice(0, 3)).toEqual(['IHDR', 'sRGB', 'pHYs']);
		expect(order.indexOf('IDAT')).toBeGreaterThan(order.indexOf('pHYs'));
		expect([...chunks[1].data]).toEqual([1]);
		expect(order.filter((type) => type === 'IEND').length).toBe(1);
	});

	it('is white or nothing where the sheet has no ink', async () => {
		const corner = async (ground: 'white' | 'none') => [
			...PNG.sync.read(Buffer.from(await made({ dpi: 72, ground }))).data.subarray(0, 4),
		];
		expect(await corner('white')).toEqual([255, 255, 255, 255]);
		expect(await corner('none')).toEqual([0, 0, 0, 0]);
	});

	it('is the same bytes every time', async () => {
		expect(Buffer.compare(await made({ dpi: 72 }), await made({ dpi: 72 }))).toBe(0);
	});

	it('says what it drops of what it was told before', async () => {
		const once = withPixelSize(await made({ dpi: 72 }), 300);
		const sizes = chunksOf(once).filter(({ type }) => type === 'pHYs');
		expect(sizes.map(({ data }) => data.readUInt32BE(0))).toEqual([11811]);
		expect(() => withPixelSize(Uint8Array.of(1, 2, 3), 300)).toThrow(RangeError);
	});
});

describe('pixels of a sheet', () => {
	const a4 = { widthMm: 297, heightMm: 210 };

	it('are told, up to the limit', () => {
		expect(pixelsOf(a4, 600)).toEqual({ status: 'fits', width: 7016, height: 4961 });
		expect(pixelsOf({ widthMm: 841, heightMm: 594 }, 300).status).toBe('fits');
	});

	it('are refused past it, with what would do', () => {
		const a0 = { widthMm: 1189, heightMm: 841 };
		const refused = pixelsOf(a0, 600);
		if (refused.status !== 'refused') throw new Error('it fits');
		expect(refused.reason).toBe('too-many-pixels');
		const most = Number(/up to (\d+) /.exec(refused.message)![1]);
		expect(pixelsOf(a0, most)).toMatchObject({ status: 'fits' });
		expect(pixelsOf(a0, most + 1)).toMatchObject({ status: 'refused' });
		expect(pixelsOf({ widthMm: 5000, heightMm: 5000 }, 72)).toMatchObject({ status: 'refused' });
		expect(pixelLimit).toBeLessThan(2 ** 31 / 4);
	});

	it('are a whole number an inch within the limits', async () => {
		for (const dpi of [71, 601, 100.5, Number.NaN, -300]) {
			expect(pixelsOf(a4, dpi)).toMatchObject({ status: 'refused', reason: 'bad-option' });
		}
		const large = sourceOf(statesCoverage(), { layout: { ...layout, paper: 'A0' } });
		const outcome = await exportFile('png', large, { dpi: 600 }, { rasterise });
		expect(outcome.status).toBe('refused');
	});
});
