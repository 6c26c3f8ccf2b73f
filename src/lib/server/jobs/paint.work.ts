import { gzipSync } from 'node:zlib';
import { decodeCoverage } from '../../engines/boundaries/index.ts';
import type { BorderList } from '../../engines/borders/index.ts';
import type { Ink, Reader } from '../../engines/palettes/index.ts';
import { drawSheet, paintSvg, type Drawing, type SheetLayout } from '../../engines/sheet/index.ts';
import { facesIn } from './faces.ts';
import type { Task } from './task-port.ts';

export interface PaintInput {
	/** the coverage as stored */
	geometry: Uint8Array;
	/** those that bind on the sheet */
	borders: BorderList;
	groups: (string | null)[];
	/** ink of each region; null while nothing is coloured */
	colouring: ArrayLike<number> | null;
	inks: Ink[];
	layout: SheetLayout;
	reader: Reader;
	locked: number[];
	/** what is issued and when, in words */
	issue: string;
	/** whether the file is to be seen outside the product, and so carries its faces */
	carriesFaces: boolean;
}

/** Draws the sheet; a region whose ink the palette lacks is drawn as not coloured. */
export function drawing(input: PaintInput): Drawing {
	const coverage = decodeCoverage(input.geometry);
	const locked = new Uint8Array(coverage.keys.length);
	for (const region of input.locked) locked[region] = 1;
	const { borders, groups, inks, layout, reader, issue } = input;
	const colouring =
		input.colouring && Int32Array.from(input.colouring, (ink) => (ink < inks.length ? ink : -1));
	return drawSheet({
		...{ coverage, borders, groups, inks, layout, reader, issue },
		...{ colouring, locked, weak: [] },
	});
}

/** A drawn sheet as an SVG file. */
export function svgOf(drawn: Drawing, carriesFaces: boolean): string {
	const fonts = carriesFaces ? facesIn(drawn) : [];
	return `<?xml version="1.0" encoding="UTF-8"?>\n${paintSvg(drawn, { fills: 'class', fonts })}`;
}

/** Draws and paints a sheet, packed for the way to the browser. */
export function paintSheet({ input }: Task<PaintInput>): { gzip: Uint8Array } {
	return { gzip: gzipSync(svgOf(drawing(input), input.carriesFaces)) };
}
