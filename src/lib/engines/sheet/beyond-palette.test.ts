import { describe, expect, it } from 'vitest';
import { inks, sheetOf, statesCoverage } from '../../../../tests/support/sheets.ts';
import { drawSheet, paintSvg, recolour, uncoloured } from './index.ts';

/** One region has an ink more than the palette holds, as when reserved inks ask for more. */
const coverage = statesCoverage();
const colouring = coverage.keys.map((_, r) => (r === 0 ? inks.length : r % 3));

describe('an ink beyond the palette', () => {
	it('is painted without a colour, and has no box in the legend, when a sheet is coloured again', () => {
		const plain = drawSheet(sheetOf(coverage));
		const again = recolour(plain, Int32Array.from(colouring), [...inks], 'typical');
		expect(again.fills[0]).toMatchObject({ ink: inks.length, hex: uncoloured });
		const words = again.texts.filter(({ layer }) => layer === 'legend').map(({ text }) => text);
		expect(words).toContain('Ochre');
		expect(words).not.toContain(String(inks.length + 1));
		expect(paintSvg(again, { fills: 'attribute' })).toContain(
			`ink ${inks.length + 1} not in the palette`,
		);
	});
});
