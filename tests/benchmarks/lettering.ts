import { drawSheet, type Drawing, type SheetInput } from '../../src/lib/engines/sheet/index.ts';
import {
	countiesSheet,
	statesSheet,
	tavaroeSheet,
	worldSheet,
} from '../support/lettered-sheets.ts';

/** How many names a sheet sets, and how: counted from the drawing alone. */
function tally({ fills, lines, texts, unplaced }: Drawing) {
	const labels = texts.filter(({ layer, region }) => layer === 'label' && region !== undefined);
	const on = new Set(labels.filter(({ onFill }) => onFill).map(({ region }) => region));
	const off = new Set(labels.filter(({ onFill }) => !onFill).map(({ region }) => region));
	const leaders = lines.find(({ rank }) => rank === 'leader')?.arcs.length ?? 0;
	return {
		...{ regions: fills.length, inside: on.size, beside: off.size - leaders, leaders },
		...{ unplaced: unplaced.length, points: Math.round((labels[0]?.size ?? 0) / 3.528) / 10 },
	};
}

/** Names on sheets that are hard to letter: counts, and milliseconds for the whole drawing. */
export async function* run(): AsyncGenerator<object> {
	const sheets: [string, SheetInput][] = [
		['states A4', statesSheet()],
		['districts A4', await tavaroeSheet()],
		['districts A4, no level above', await tavaroeSheet(false)],
		['world A3', worldSheet()],
		['counties A1', countiesSheet()],
	];
	for (const [sheet, input] of sheets) {
		const start = performance.now();
		const drawing = drawSheet(input);
		const ms = Math.round(performance.now() - start);
		yield { benchmark: 'lettering', sheet, ...tally(drawing), ms };
	}
}
