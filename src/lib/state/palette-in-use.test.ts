import { expect, it } from 'vitest';
import { paletteInUse } from './palette-in-use';

const inks = [{ name: 'Ochre', hex: '#ebb855' }];
const brand = { id: 'brand', name: 'Brand', inks };
const other = { id: 'other', name: 'Other', inks };

it('is the palette that the sheet took, while it has the same inks', () => {
	expect(paletteInUse({ ...brand }, [other, brand])).toEqual({ known: brand });
});

it('is none of those offered once the team changed it: it can be chosen again', () => {
	const changed = { ...brand, inks: [{ name: 'Ochre', hex: '#ebb856' }] };
	expect(paletteInUse({ ...brand }, [other, changed])).toEqual({ moved: changed });
});

it('names what the sheet’s own inks were made from', () => {
	const own = { id: 'own', name: 'Brand, changed', inks, from: 'brand' };
	expect(paletteInUse(own, [other, brand])).toEqual({ made: brand });
	expect(paletteInUse({ ...own, from: undefined }, [other, brand])).toEqual({});
});
