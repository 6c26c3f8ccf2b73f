import { describe, expect, it } from 'vitest';
import { layout, sheetOf, statesCoverage } from '../../../../tests/support/sheets.ts';
import type { Ground } from './canvas/ground.ts';
import type { Pen } from './canvas/paint-area.ts';
import { strokeChains } from './canvas/stroke-chains.ts';
import { chainsOf } from './chains.ts';
import { drawSheet } from './draw-sheet.ts';
import type { LineLayer } from './drawing.ts';
import { paintSvg } from './svg/paint-svg.ts';

/** Four arcs that meet in (100, 100) as a cross with a bent arm, and a ring of two arcs. */
const paths = [
	[0, 100, 100, 100],
	[200, 104, 100, 100],
	[100, 100, 100, 0],
	[100, 100, 90, 200],
	[300, 300, 400, 300, 400, 400],
	[300, 300, 300, 400, 400, 400],
];
const arcs = {
	arcPoints: Int32Array.from(paths.flat()),
	arcStarts: Uint32Array.from([0, ...paths.map((_, i) => paths.slice(0, i + 1).flat().length / 2)]),
};

describe('chains on a canvas', () => {
	it('are closed where they come back, as in the SVG, and left open elsewhere', () => {
		const calls: string[] = [];
		const pen = {
			...{ beginPath() {}, moveTo() {}, lineTo() {} },
			...{ closePath: () => calls.push('close'), stroke: () => calls.push('stroke') },
		};
		const square = {
			arcPoints: Int32Array.of(0, 0, 100, 0, 100, 100, 100, 100, 0, 100, 0, 0),
			arcStarts: Uint32Array.of(0, 3, 6),
		};
		const look = { hex: '#000000', width: 10 };
		const chains = [Int32Array.of(0, 1), Int32Array.of(~1, ~0), Int32Array.of(0)];
		strokeChains(pen as unknown as Pen, square as Ground, chains, look);
		expect(calls).toEqual(['close', 'stroke', 'close', 'stroke', 'stroke']);
	});
});

describe('chains', () => {
	it('go on straight where several lines meet, and close rings', () => {
		const chains = chainsOf(arcs, Uint32Array.of(0, 1, 2, 3, 4, 5)).map((chain) => [...chain]);
		expect(chains).toEqual([
			[0, ~1],
			[~2, 3],
			[4, ~5],
		]);
	});

	it('hold every arc of a sheet once, each beginning where the last one ended', () => {
		const dashed = { widthMm: 0.3, hex: '#334455', dashMm: [2, 1] };
		const lines = { ...layout.lines, region: dashed, outer: dashed };
		const drawing = drawSheet(sheetOf(statesCoverage(), { layout: { ...layout, lines } }));
		for (const rank of ['region', 'outer']) {
			const line = drawing.lines.find((one) => one.rank === rank) as Required<LineLayer>;
			expect(line).toMatchObject({ width: 30, hex: '#334455', dash: [200, 100] });
			const all = line.chains.flatMap((chain) => [...chain].map((one) => (one < 0 ? ~one : one)));
			expect(all.sort((a, b) => a - b)).toEqual([...line.arcs].sort((a, b) => a - b));
			expect(line.chains.length).toBeLessThan(line.arcs.length / 1.5);
			const end = (signed: number, first: boolean) => {
				const arc = signed < 0 ? ~signed : signed;
				const point =
					signed < 0 === first ? drawing.arcStarts[arc + 1] - 1 : drawing.arcStarts[arc];
				return [drawing.arcPoints[2 * point], drawing.arcPoints[2 * point + 1]];
			};
			for (const chain of line.chains)
				for (let i = 1; i < chain.length; i++)
					expect(end(chain[i], true)).toEqual(end(chain[i - 1], false));
		}
		const svg = paintSvg(drawing, { fills: 'attribute' });
		const [, path] =
			/id="borders-region"[^>]*stroke-dasharray="200 100"[^>]*><path d="([^"]*)"/.exec(svg)!;
		const drawn = drawing.lines.find(({ rank }) => rank === 'region')!;
		expect(path.match(/M/g)).toHaveLength(drawn.chains!.length);
		expect(path).toMatch(/^(M\d+ \d+l[-\d ]+z?)+$/);
	});
});
