import { readers, type Reader } from '../colour/reader.ts';
import { labOf } from '../colour/lab.ts';
import { appearanceOf, found } from './appearance.ts';
import { checkBorderLine } from './border-line.ts';
import { alikeBelow, greySafeFrom, greyWarnBelow } from './demand.ts';

/** The two classes that a reader tells apart least. */
export interface ReaderVerdict {
	reader: Reader;
	severity: 'clear' | 'warning' | 'error';
	/** class numbers from 0, a < b, and whether they stand next to each other in the legend */
	a: number;
	b: number;
	next: boolean;
	/** CIEDE2000, for grey print the gap in L* */
	found: number;
	asked: number;
}

export interface RampVerdict {
	readers: ReaderVerdict[];
	/** for each class the readers who could take it for some other, and how badly */
	byClass: { readers: Reader[]; severity: 'clear' | 'warning' | 'error' }[];
	/** L* rises or falls from class to class, so that grey print keeps the order */
	ordered: boolean;
	/** classes on which the border line has less than 3:1, so that regions of one class run together */
	faintLines: number[];
	/** nothing worse than a warning for any reader */
	usable: boolean;
}

/** What classes of a themed map need where they touch, regions of 10 mm and more: see `demandFor`. */
const asked = 10;

/**
 * What every reader sees of the colours of classes. In: `#rrggbb`, lowest class first; the
 * colour of the line between regions. Out: for each reader
 * the pair of classes that is told apart least, all pairs looked at, since any two classes may touch.
 * Error below 5 in CIEDE2000, warning below 10. In grey print classes are amounts that must be read off, so
 * it is stricter than for a colouring: an error below 5 in L*, a warning below 8.
 * Source: as `checkPalette`; WCAG 2.2, 1.4.11 for the line.
 */
export function judgeRamp(hexes: readonly string[], lineHex = '#000000'): RampVerdict {
	const seen = hexes.map(appearanceOf);
	const all = readers.flatMap((reader) =>
		hexes.flatMap((_, b) =>
			hexes.slice(0, b).map((_, a): ReaderVerdict => {
				const value = found(reader, seen[a], seen[b]);
				return { reader, a, b, next: b === a + 1, found: value, ...severityOf(reader, value) };
			}),
		),
	);
	const worst = readers.flatMap((reader) => {
		const of = all.filter((one) => one.reader === reader);
		return of.length ? of.reduce((one, two) => (two.found < one.found ? two : one)) : [];
	});
	const light = hexes.map((hex) => labOf(hex)[0]);
	const rises = light.map((one, i) => Math.sign(one - (light[i - 1] ?? one))).slice(1);
	return {
		readers: worst,
		byClass: hexes.map((_, one) => ofClass(all, one)),
		ordered: rises.every((one) => one > 0) || rises.every((one) => one < 0),
		faintLines: checkBorderLine(lineHex, hexes).flatMap(({ ink, passes }) => (passes ? [] : ink)),
		usable: worst.every(({ severity }) => severity !== 'error'),
	};
}

function ofClass(all: readonly ReaderVerdict[], one: number): RampVerdict['byClass'][number] {
	const close = all.filter(
		({ a, b, severity }) => severity !== 'clear' && (a === one || b === one),
	);
	const seenBy = new Set(close.map(({ reader }) => reader));
	const bad = close.some(({ severity }) => severity === 'error');
	return {
		readers: readers.filter((reader) => seenBy.has(reader)),
		severity: bad ? 'error' : close.length ? 'warning' : 'clear',
	};
}

function severityOf(reader: Reader, value: number): Pick<ReaderVerdict, 'severity' | 'asked'> {
	const [error, enough] = reader === 'grey' ? [greyWarnBelow, greySafeFrom] : [alikeBelow, asked];
	const severity = value < error ? 'error' : value < enough ? 'warning' : 'clear';
	return { severity, asked: enough };
}
