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
	/** L* rises or falls from class to class, so that grey print keeps the order */
	ordered: boolean;
	/** classes on which a black border line has less than 3:1 */
	faintLines: number[];
	/** nothing worse than a warning for any reader */
	usable: boolean;
}

/** What classes of a themed map need where they touch, regions of 10 mm and more: see `demandFor`. */
const asked = 10;

/**
 * What every reader sees of the colours of classes. In: `#rrggbb`, lowest class first. Out: for each reader
 * the pair of classes that is told apart least, all pairs looked at, since any two classes may touch;
 * severity as elsewhere: error below 5 in CIEDE2000 or in L*, warning below 10, for grey print below 8.
 * Source: as `checkPalette`; WCAG 2.2, 1.4.11 for the line.
 */
export function judgeRamp(hexes: readonly string[]): RampVerdict {
	const seen = hexes.map(appearanceOf);
	const verdicts = readers.flatMap((reader) => {
		let worst: ReaderVerdict | null = null;
		for (let b = 1; b < hexes.length; b++) {
			for (let a = 0; a < b; a++) {
				const value = found(reader, seen[a], seen[b]);
				if (worst && worst.found <= value) continue;
				worst = { reader, a, b, next: b === a + 1, found: value, ...severityOf(reader, value) };
			}
		}
		return worst ?? [];
	});
	const light = hexes.map((hex) => labOf(hex)[0]);
	const rises = light.map((one, i) => Math.sign(one - (light[i - 1] ?? one))).slice(1);
	return {
		readers: verdicts,
		ordered: rises.every((one) => one > 0) || rises.every((one) => one < 0),
		faintLines: checkBorderLine('#000000', hexes).flatMap(({ ink, passes }) => (passes ? [] : ink)),
		usable: verdicts.every(({ severity }) => severity !== 'error'),
	};
}

function severityOf(reader: Reader, value: number): Pick<ReaderVerdict, 'severity' | 'asked'> {
	const [error, enough] = reader === 'grey' ? [greyWarnBelow, greySafeFrom] : [alikeBelow, asked];
	const severity = value < error ? 'error' : value < enough ? 'warning' : 'clear';
	return { severity, asked: enough };
}
