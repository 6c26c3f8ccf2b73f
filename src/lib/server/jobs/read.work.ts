import type { BoundaryOptions, Coverage } from '../../engines/boundaries/index.ts';
import type { BorderList } from '../../engines/borders/index.ts';
import type { Draft } from '../../engines/editions/draft.ts';
import { problemOf } from '../services/draft-problem.ts';
import { firstDraft } from '../services/first-draft.ts';
import { paletteFor } from '../services/house-palette.ts';
import { colourAndCheck, type CheckedColouring } from './colour.work.ts';
import { fileSource } from './file-source.ts';
import { readAnswered, type KnownAnswer } from './read-answered.ts';
import { groundOf, type ReadGround, type RefusedReading } from './read-ground.ts';
import { teller, type Task } from './task-port.ts';

export interface ReadInput {
	path: string;
	fileName: string;
	options: BoundaryOptions;
	/** what the team answered about earlier files */
	answers: KnownAnswer[];
	/** of the sheet that is to be */
	title: string;
}

export type ReadOutcome =
	RefusedReading | ({ status: 'accepted'; draft: Draft; colouring: CheckedColouring } & ReadGround);

/** From a file's bytes to everything that is stored about it: read, judged planar or not, coloured. */
export async function readFile({ input, port }: Task<ReadInput>): Promise<ReadOutcome> {
	const tell = teller(port);
	tell('Reading', 0);
	const source = fileSource(input.path, input.fileName);
	// reading is most of the work; colouring and packing follow
	const reading = await readAnswered(source, input.options, input.answers, (step, share) =>
		tell(step, 0.85 * share),
	);
	const { result, taken } = reading;
	if (result.status === 'refused') return { ...result, taken };
	tell('Colouring', 0.87);
	const { draft, colouring } = await colourFirst(input.title, result.coverage, result.borders);
	tell('Thinning borders for the screen and packing', 0.93);
	return { status: 'accepted', ...groundOf(result, reading), draft, colouring };
}

/** The first draft: fewest inks, in the shortest house palette that has as many. */
async function colourFirst(title: string, coverage: Coverage, borders: BorderList) {
	const ground = { keys: coverage.keys, borders };
	const portrait = isTall(coverage.arcPoints);
	const plain = firstDraft({ title, palette: paletteFor(0), portrait });
	const colouring = await colourAndCheck(problemOf(ground, plain));
	const { result } = colouring;
	const inks = result.status === 'coloured' ? result.inksUsed : 0;
	return { draft: firstDraft({ title, palette: paletteFor(inks), portrait }), colouring };
}

/** Whether the ground is taller than wide, as the crow flies at its middle latitude. */
function isTall(points: Float64Array): boolean {
	let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
	for (let i = 0; i < points.length; i += 2) {
		west = Math.min(west, points[i]);
		east = Math.max(east, points[i]);
		south = Math.min(south, points[i + 1]);
		north = Math.max(north, points[i + 1]);
	}
	const shrink = Math.cos((((south + north) / 2) * Math.PI) / 180);
	return north - south > (east - west) * shrink;
}
