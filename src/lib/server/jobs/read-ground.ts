import {
	encodeCoverage,
	type BoundariesResult,
	type BoundaryOptions,
	type Coverage,
	type Finding,
	type Found,
	type Question,
} from '../../engines/boundaries/index.ts';
import { borderKinds, type BorderList } from '../../engines/borders/index.ts';
import type { SourceNote } from '../../schemas/desk.ts';
import type { PieceColumns } from '../../schemas/pieces.ts';
import type { BoundaryColumns } from '../repositories/boundaries.repository.ts';
import { packedLevels, type PackedLevel } from './display-levels.work.ts';
import { pieceColumns } from './pieces.work.ts';
import { planarityOf, type PlanarityNote } from './planarity.work.ts';
import type { KnownAnswer } from './read-answered.ts';

/** Why a file was not read; with a question where an answer would let it be read. */
export interface RefusedReading {
	status: 'refused';
	code: string;
	message: string;
	findings: Finding[];
	question: Question | null;
	/** earlier answers that were taken before it was refused */
	taken: KnownAnswer[];
}

/** Everything that is stored about an accepted file, whichever sheet it is for. */
export interface ReadGround {
	columns: BoundaryColumns;
	/** the coverage, encoded as it is stored and sent to browsers */
	geometry: Uint8Array;
	/** thinned for the screen, coarsest first */
	levels: PackedLevel[];
	pieces: PieceColumns;
	attributeColumns: string[];
	source: SourceNote;
	found: Found;
	/** with which it can be read so again */
	options: BoundaryOptions;
	/** earlier answers that were taken */
	taken: KnownAnswer[];
	planar: boolean;
	planarWitness: PlanarityNote['witness'];
}

export type AcceptedReading = Extract<BoundariesResult, { status: 'accepted' }>;

/** Whatever else a boundary set is to hold is computed here, for uploads and re-cuts alike. */
export function groundOf(
	{ coverage, borders, attributes, findings, source, found }: AcceptedReading,
	{ options, taken }: Pick<ReadGround, 'options' | 'taken'>,
): ReadGround {
	const regions = regionColumns(coverage, attributes);
	const { planar, witness } = planarityOf(coverage, borders);
	return {
		columns: { regions, borders: borderColumns(borders), findings },
		geometry: encodeCoverage(coverage),
		levels: packedLevels(coverage),
		pieces: pieceColumns(coverage),
		attributeColumns: attributes.columns,
		...{ source, found, options, taken, planar },
		planarWitness: witness,
	};
}

function regionColumns(
	coverage: Coverage,
	{ columns, rows }: AcceptedReading['attributes'],
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
const attributesJson = (
	columns: string[],
	row: AcceptedReading['attributes']['rows'][number],
): string =>
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
