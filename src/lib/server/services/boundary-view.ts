import {
	borderKinds,
	type BorderKind,
	type BorderList,
} from '../../engines/borders/border-list.ts';
import type { Db } from '../database/connection.ts';
import {
	findBoundarySet,
	readColumns,
	type BoundarySetNote,
	type StoredColumns,
} from '../repositories/boundaries.repository.ts';
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
	borders: BorderList;
}

/** Regions of all the views kept at once; about 200 bytes each. */
const mostKept = 400_000;
const kept = new Map<string, BoundaryView>();

/** Reads a set, or has it at hand: a boundary set never changes once it is stored. */
export async function boundaryView(db: Db, id: string): Promise<BoundaryView> {
	const known = kept.get(id);
	if (known) {
		kept.delete(id);
		kept.set(id, known);
		return known;
	}
	const set = await findBoundarySet(db, id);
	if (!set) throw new NotFound('boundary set');
	const view = viewOf(set, await readColumns(db, id));
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

function viewOf(set: BoundarySetNote, columns: StoredColumns): BoundaryView {
	return {
		set,
		keys: columns.key,
		names: columns.name,
		parts: columns.parts,
		areasKm2: columns.areaKm2,
		enclaveOf: columns.enclaveOf,
		borders: bordersOfColumns(columns),
	};
}

function bordersOfColumns({ a, b, kind, metres, lon, lat }: StoredColumns): BorderList {
	const at = new Float64Array(2 * a.length);
	lon.forEach((value, i) => (at[2 * i] = value));
	lat.forEach((value, i) => (at[2 * i + 1] = value));
	return {
		a: Uint32Array.from(a),
		b: Uint32Array.from(b),
		kind: Uint8Array.from(kind, (name) => borderKinds.indexOf(name as BorderKind)),
		metres: Float64Array.from(metres),
		at,
	};
}
