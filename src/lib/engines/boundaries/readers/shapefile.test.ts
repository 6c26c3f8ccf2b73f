import { expect, it } from 'vitest';
import { strToU8, zipSync } from 'fflate';
import { writeDbf } from '../../../../../tests/support/dbf.ts';
import { accepted, box, refusal, region } from '../../../../../tests/support/read-boundaries.ts';
import { shapefileMembers } from '../../../../../tests/support/shapefile.ts';
import { dbfRows, openDbf, type DbfTable } from './dbf.ts';

async function rowsOf(table: DbfTable, encoding: string) {
	const rows = [];
	for await (const row of dbfRows(table, encoding)) rows.push(row);
	return rows;
}

it('reads texts in their encoding, also where the last byte looks like a space', async () => {
	// WHATWG Encoding Standard: à is C3 A0 in UTF-8; 9C and 9A are œ and š in windows-1252.
	const utf8 = openDbf(writeDbf([{ città: 'libertà' }, { città: '' }], 'utf-8', 0));
	expect(await rowsOf(utf8, 'utf-8')).toEqual([{ città: 'libertà' }, { città: null }]);
	const bytes = writeDbf([{ name: '12' }], 'utf-8', 0);
	bytes.set([0x9c, 0x9a], 32 + 32 + 1 + 1);
	expect(await rowsOf(openDbf(bytes), 'windows-1252')).toEqual([{ name: 'œš' }]);
	const cyrillic = openDbf(writeDbf([{ имя: 'Мост' }], 'windows-1251', 0));
	expect(await rowsOf(cyrillic, 'windows-1251')).toEqual([{ имя: 'Мост' }]);
});

it('keeps long numbers, days and unknown kinds of column as written', async () => {
	// dBASE III file structure: type N is a number in digits, D a day as YYYYMMDD.
	const row = { long: '90071992547409931', short: '12.5', day: '20240229', odd: 'as is' };
	const bytes = writeDbf([row], 'utf-8', 0);
	['N', 'N', 'D', '@'].forEach((type, i) => (bytes[32 + 32 * i + 11] = type.charCodeAt(0)));
	expect(await rowsOf(openDbf(bytes), 'utf-8')).toEqual([
		{ long: '90071992547409931', short: 12.5, day: '2024-02-29', odd: 'as is' },
	]);
});

it('refuses tables that end early, have no width or whose list of columns has no end', () => {
	const good = writeDbf([{ a: 1 }, { a: 2 }], 'utf-8', 0);
	const spoilt = (at: number, value: number) => {
		const bytes = good.slice();
		bytes[at] = value;
		return () => openDbf(bytes);
	};
	expect(spoilt(4, 200)).toThrow(/cut off/);
	expect(spoilt(10, 0)).toThrow(/no width/);
	expect(spoilt(64, 0x41)).toThrow(/no end/);
});

it('refuses a table whose rows end before their number says', async () => {
	const members = shapefileMembers({ features: [box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)] });
	const dbf = writeDbf([{ a: 'x' }, { a: 'y' }], 'utf-8', 0);
	dbf[32 + 32 + 1 + 2] = 0x1a;
	const refused = await refusal(zipSync({ ...members, 'regions.dbf': dbf }));
	expect(refused.code).toBe('file-truncated');
	expect(refused.message).toContain('2 rows but ends after 1');
});

it('refuses a record with more holes than can be told apart, naming it', async () => {
	const holes = Array.from({ length: 15_000 }, (_, i) => {
		const [x, y] = [(i % 150) / 151, Math.floor(i / 150) / 101];
		return [
			[x + 0.001, y + 0.001],
			[x + 0.001, y + 0.002],
			[x + 0.002, y + 0.001],
		];
	});
	const edge = Array.from({ length: 15_000 }, (_, i) => [i / 15_000, -1]);
	const sieve = region('sieve', [...edge, [1, 1], [0, 1]], ...holes);
	const members = shapefileMembers({ features: [box('a', 2, 0, 3, 1), sieve] });
	members['regions.prj'] = strToU8(wgs84);
	const refused = await refusal(zipSync(members));
	expect(refused.code).toBe('too-large-unpacked');
	expect(refused.message).toMatch(/Record 2 .* 15000 holes among 15001 rings/);
});

it('keeps holes and islands in them apart', async () => {
	const ring = (lo: number, hi: number) => box('', lo, lo, hi, hi).geometry.coordinates[0];
	const target = {
		...box('t', 0, 0, 1, 1),
		geometry: {
			type: 'MultiPolygon' as const,
			coordinates: [[ring(0, 9), ring(1, 8)], [ring(2, 7)]],
		},
	};
	const members = shapefileMembers({ features: [target], prj: wgs84 });
	const { coverage } = await accepted(zipSync(members));
	expect([...coverage.partRings]).toEqual([0, 2, 3]);
});

const wgs84 =
	'GEOGCS["WGS 84",DATUM["WGS_1984",SPHEROID["WGS 84",6378137,298.257223563]],PRIMEM["Greenwich",0],UNIT["degree",0.0174532925199433]]';
