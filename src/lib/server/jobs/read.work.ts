import {
	encodeCoverage,
	readBoundaries,
	type BoundariesResult,
	type BoundaryOptions,
	type Coverage,
	type Finding,
	type Found,
	type Question,
} from '../../engines/boundaries/index.ts';
import { borderKinds, type BorderList } from '../../engines/borders/index.ts';
import type { Draft } from '../../engines/editions/draft.ts';
import type { SourceNote } from '../../schemas/desk.ts';
import type { BoundaryColumns } from '../repositories/boundaries.repository.ts';
import { problemOf } from '../services/draft-problem.ts';
import { firstDraft } from '../services/first-draft.ts';
import { colourAndCheck, type CheckedColouring } from './colour.work.ts';
import { fileSource } from './file-source.ts';
import { paletteFor } from '../services/house-palette.ts';
import { packedLevels, type PackedLevel } from './display-levels.work.ts';
import { planarityOf, type PlanarityNote } from './planarity.work.ts';
import { teller, type Task } from './task-port.ts';

export interface ReadInput {
	path: string;
	fileName: string;
	options: BoundaryOptions;
	/** of the sheet that is to be */
	title: string;
}

export type ReadOutcome =
	| {
			status: 'refused';
			code: string;
			message: string;
			findings: Finding[];
			question: Question | null;
	  }
	| {
			status: 'accepted';
			columns: BoundaryColumns;
			/** the coverage, encoded as it is stored and sent to browsers */
			geometry: Uint8Array;
			/** thinned for the screen, coarsest first */
			levels: PackedLevel[];
			attributeColumns: string[];
			source: SourceNote;
			found: Found;
			planar: boolean;
			planarWitness: PlanarityNote['witness'];
			draft: Draft;
			colouring: CheckedColouring;
	  };

/** From a file's bytes to everything that is stored about it: read, judged planar or not, coloured. */
export async function readFile({ input, port }: Task<ReadInput>): Promise<ReadOutcome> {
	const tell = teller(port);
	tell('Reading', 0);
	const result = await readBoundaries(fileSource(input.path, input.fileName), input.options, {
		// reading is most of the work; colouring and packing follow
		progress: (step, share) => tell(step, 0.85 * share),
	});
	if (result.status === 'cancelled') throw new Error('reading ended without being asked to');
	if (result.status === 'refused') return result;
	return prepare(input, result, tell);
}

type Accepted = Extract<BoundariesResult, { status: 'accepted' }>;

async function prepare(
	input: ReadInput,
	{ coverage, borders, attributes, findings, source, found }: Accepted,
	tell: (step: string, share: number) => void,
): Promise<ReadOutcome> {
	tell('Judging whether the map is planar', 0.86);
	const regions = regionColumns(coverage, attributes);
	const { planar, witness } = planarityOf(regions.name, regions.parts, borders);
	tell('Colouring', 0.9);
	const { draft, colouring } = await colourFirst(input.title, coverage, borders);
	tell('Thinning borders for the screen', 0.93);
	const levels = packedLevels(coverage);
	tell('Packing', 0.97);
	return {
		status: 'accepted',
		columns: { regions, borders: borderColumns(borders), findings },
		geometry: encodeCoverage(coverage),
		levels,
		attributeColumns: attributes.columns,
		source,
		found,
		planar,
		planarWitness: witness,
		draft,
		colouring,
	};
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

function regionColumns(
	coverage: Coverage,
	{ columns, rows }: Accepted['attributes'],
): BoundaryColumns['regions'] {
	return {
		key: coverage.keys,
		name: coverage.names,
		parts: coverage.keys.map((_, i) => coverage.regionParts[i + 1] - coverage.regionParts[i]),
		areaKm2: Array.from(coverage.areasKm2),
		enclaveOf: Array.from(coverage.enclaveOf),
		attributes: rows.map((row) => attributesJson(columns, row)),
	};
}

/** PostgreSQL's text cannot hold the character zero; nothing readable is lost without it. */
const attributesJson = (columns: string[], row: Accepted['attributes']['rows'][number]): string =>
	JSON.stringify(Object.fromEntries(columns.map((name, c) => [name, row[c]]))).replaceAll(
		'\\u0000',
		'',
	);

function borderColumns({ a, b, kind, metres, at }: BorderList): BoundaryColumns['borders'] {
	return {
		a: Array.from(a),
		b: Array.from(b),
		kind: Array.from(kind, (code) => borderKinds[code]),
		metres: Array.from(metres),
		lon: Array.from(a, (_, i) => at[2 * i]),
		lat: Array.from(a, (_, i) => at[2 * i + 1]),
	};
}
