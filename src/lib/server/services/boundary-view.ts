import {
	borderKinds,
	type BorderKind,
	type BorderList,
} from '../../engines/borders/border-list.ts';
import { withGaps, type GapList } from '../../engines/borders/with-gaps.ts';
import type { Db } from '../database/connection.ts';
import {
	findBoundarySet,
	readColumns,
	type BoundarySetNote,
	type StoredColumns,
} from '../repositories/boundaries.repository.ts';
import { findGapsKm, readGaps, type StoredGaps } from '../repositories/gaps.repository.ts';
import { NotFound } from './outcomes.ts';

/** A boundary set as the services use it: its note, its regions and its borders, without geometry. */
export interface BoundaryView {
	set: BoundarySetNote;
	keys: string[];
	names: string[];
	parts: number[];
	areasKm2: number[];
	/** -1 for none */
	enclaveOf: number[];
	/** as found when the file was read, with the gaps that were measured since */
	borders: BorderList;
	/** without the gaps */
	asRead: BorderList;
}

/** Regions of all the views kept at once; about 200 bytes each. */
const mostKept = 400_000;
const kept = new Map<string, BoundaryView>();

/**
 * Reads a set, or has it at hand: a boundary set never changes once it is stored, except that gaps are
 * measured farther, which whoever has it at hand looks up.
 */
export async function boundaryView(db: Db, id: string): Promise<BoundaryView> {
	const known = kept.get(id);
	kept.delete(id);
	if (known && (await findGapsKm(db, id)) === known.set.gaps_km) {
		kept.set(id, known);
		return known;
	}
	const set = await findBoundarySet(db, id);
	if (!set) throw new NotFound('boundary set');
	const view = viewOf(set, await readColumns(db, id), await readGaps(db, id));
	kept.set(id, view);
	makeRoom();
	return view;
}

/** Forgets the views longest unused until the rest fits. */
function makeRoom(): void {
	let regions = 0;
	for (const view of kept.values()) regions += view.keys.length;
	for (const [id, view] of kept) {
		if (regions <= mostKept || kept.size === 1) return;
		kept.delete(id);
		regions -= view.keys.length;
	}
}

function viewOf(set: BoundarySetNote, columns: StoredColumns, gaps: StoredGaps): BoundaryView {
	const asRead = bordersOfColumns(columns);
	return {
		set,
		keys: columns.key,
		names: columns.name,
		parts: columns.parts,
		areasKm2: columns.areaKm2,
		enclaveOf: columns.enclaveOf,
		borders: withGaps(columns.key.length, asRead, gapsOfColumns(gaps)),
		asRead,
	};
}

const bordersOfColumns = (columns: StoredColumns): BorderList => ({
	...gapsOfColumns(columns),
	kind: Uint8Array.from(columns.kind, (name) => borderKinds.indexOf(name as BorderKind)),
});

function gapsOfColumns({ a, b, metres, lon, lat }: StoredGaps): GapList {
	const at = new Float64Array(2 * a.length);
	lon.forEach((value, i) => (at[2 * i] = value));
	lat.forEach((value, i) => (at[2 * i + 1] = value));
	return {
		a: Uint32Array.from(a),
		b: Uint32Array.from(b),
		metres: Float64Array.from(metres),
		at,
	};
}
