import { strToU8 } from 'fflate';
import { describe, expect, it } from 'vitest';
import { accepted, refusal } from '../../../../../tests/support/read-boundaries.ts';
import { readBoundaries, sourceOf } from '../index.ts';

const square = (west: number, side = 1) =>
	`POLYGON((${west} 0,${west + side} 0,${west + side} ${side},${west} ${side},${west} 0))`;
const table = (...lines: string[]) => lines.join('\n');
const read = (text: string, options?: object) => accepted(strToU8(text), options);
const refused = (text: string, options?: object) => refusal(strToU8(text), options);
const two = table('code,shape', `01,"${square(0)}"`, `02,"${square(1)}"`);

describe('what is read', () => {
	it('quoted values with commas, quotation marks and line breaks (RFC 4180)', async () => {
		const text = table(
			'"code","na""me, and more",geom',
			`1,"first\r\nline ""quoted""","${square(0)}"`,
			`2,"",  "${square(1)}"`.replace('  ', ''),
			'',
		);
		for (const ends of [text, text.replaceAll('\n', '\r\n'), `\ufeff${text}`]) {
			const { attributes, coverage } = await read(ends);
			expect(coverage.keys).toEqual(['1', '2']);
			expect(attributes.columns).toEqual(['code', 'na"me, and more']);
			expect(String(attributes.rows[0][1])).toMatch(/^first\s+line "quoted"$/);
			expect(attributes.rows[1][1]).toBeNull();
		}
	});

	it('the geometry wherever it stands, by any usual delimiter, quoted or not', async () => {
		for (const delimiter of [';', '\t', '|']) {
			const lines = [`${square(0)}`, `${square(1)}`].map((shape, i) =>
				[`n${i}`, shape, `0${i}`].join(delimiter),
			);
			const { coverage, attributes } = await read(
				table(['name', 'the geom', 'code'].join(delimiter), ...lines),
				{ keyField: 'code' },
			);
			expect(coverage.keys).toEqual(['00', '01']);
			expect(attributes.columns).toEqual(['name', 'code']);
		}
		const alone = await read(table('wkt', `"${square(0)}"`, `"${square(1)}"`));
		expect(alone.coverage.keys).toEqual(['1', '2']);
	});

	it('columns without a name or with the same one, and a table without a header', async () => {
		const named = await read(table('a,,a,g', `1,2,3,"${square(0)}"`, `4,5,6,"${square(1)}"`));
		expect(named.attributes.columns).toEqual(['a', 'column 2', 'a (2)']);
		const bare = await read(table(`x,"${square(0)}"`, `y,"${square(1)}"`));
		expect(bare.attributes.columns).toEqual(['column 1']);
		expect(bare.coverage.keys).toEqual(['x', 'y']);
	});

	it('areas rather than the points of another column, which is told', async () => {
		const { findings, coverage } = await read(
			table('middle,code,area', `POINT(0 0),a,"${square(0)}"`, `POINT(1 1),b,"${square(1)}"`),
		);
		expect(coverage.keys).toEqual(['a', 'b']);
		const told = findings.find(({ code }) => code === 'several-geometries');
		expect(told?.message).toContain('"area" was read, not middle');
	});

	it('letters that are not in UTF-8 as windows-1252, with a finding', async () => {
		const bytes = strToU8(two.replace('01', 'Z*rich'));
		bytes[bytes.indexOf('*'.charCodeAt(0))] = 0xfc;
		const { coverage, findings, source } = await accepted(bytes);
		expect(coverage.keys[0]).toBe('Zürich');
		expect(source.encoding).toBe('windows-1252');
		expect(findings.map(({ code }) => code)).toContain('encoding-guessed');
	});

	it('a system before the text, which all rows must share', async () => {
		const lines = [0, 1000].map((x) => `${x},"SRID=3857;${square(x, 1000)}"`);
		const { source } = await read(table('x,g', ...lines));
		expect(source.crs).toBe('EPSG:3857');
		const mixed = await refused(table('x,g', lines[0], lines[1].replace('3857', '3035')));
		expect(mixed.message).toMatch(/Row 3 .*EPSG:3035, but the rows before it the system EPSG:3857/);
	});

	it('a row larger than the window, and many rows', async () => {
		const corners = Array.from({ length: 120_000 }, (_, i) => `${i / 120_000} 0.000000001`);
		const large = `POLYGON((0 0,${corners.join(',')},1 0,1 1,0 1,0 0))`;
		const rows = Array.from(
			{ length: 3000 },
			(_, i) => `r${i},"${square(2 + 2 * i)}",${'x'.repeat(900)}`,
		);
		const text = table('code,g,note', `big,"${large}",`, ...rows.slice(0, 80), ',,');
		const { coverage } = await read(text);
		expect(coverage.keys).toHaveLength(81);
		const pieces = await readBoundaries(sourceOf('t', strToU8(text), 70_000));
		expect(pieces.status).toBe('accepted');
	});
});

describe('what is doubted', () => {
	it('the order of the two numbers, where both orders are possible', async () => {
		const { findings } = await read(two);
		const note = findings.find(({ code }) => code === 'axes-assumed');
		expect(note?.severity).toBe('note');
		expect(note?.message).toContain('between 0° and 2° east and between 0° and 1° north');
		expect(note?.message).toContain('between 0° and 1° east and between 0° and 2° north');
		const said = await read(two, { axes: 'latlon' });
		expect(said.findings.map(({ code }) => code)).not.toContain('axes-assumed');
		const east = await read(two.replaceAll(/\b([0-2]) (\d)/g, '12$1 $2'));
		expect(east.findings.map(({ code }) => code)).not.toContain('axes-assumed');
	});
});

describe('what is refused', () => {
	it.each([
		['a table without geometry', 'a,b\n1,2\n', 'unsupported-format', /neither/],
		[
			'a table cut off in its last shape',
			two.slice(0, -8),
			'file-truncated',
			/inside a quoted value/,
		],
		['one cut off between values', `${two}\n03`, 'file-truncated', /Row 4 .*1 values/],
		['a row of too many values', `${two}\n03,"${square(2)}",x`, 'file-damaged', /Row 4 .*3 values/],
		['a shape that is none', `${two}\n03,none`, 'file-damaged', /Row 4/],
		[
			'a curve',
			two.replace('POLYGON', 'CURVEPOLYGON'),
			'unsupported-format',
			/Row 2 .*CURVEPOLYGON/,
		],
		['a coordinate that is no number', two.replace('1 1', '1 x'), 'bad-coordinate', /Row 2 .*"x"/],
		['points alone', 'a,g\n1,POINT(0 0)\n2,POINT(1 1)\n', 'no-areas', /only 2 points/],
		[
			'quotation marks in the midst of values',
			two.replace('"\n', '" x"\n'),
			'file-damaged',
			/quotation/,
		],
		[
			'a quotation mark that never closes',
			`a;g\n1;"${square(0)}\n${'x\n'.repeat(99)}`,
			'file-truncated',
			/quoted/,
		],
	])('%s', async (_, text, code, said) => {
		const { code: got, message } = await refused(text);
		expect(got, message).toBe(code);
		expect(message).toMatch(said);
	});
});
