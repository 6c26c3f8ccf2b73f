import { createHash } from 'node:crypto';
import type { FiguresRow } from '../repositories/recut-figures.repository.ts';
import type { MeasureRow } from '../repositories/measures.repository.ts';
import type { HeldRecut, RecutRecord } from '../repositories/recuts.repository.ts';

/** Figures of one measure, one entry a region of the boundaries they are joined to. */
export type Figures = FiguresRow & { name: string };

/**
 * What stood before a re-cut was applied, and what it wrote. Drafts and territories go by their revision,
 * since every revision is kept.
 */
export interface Before {
	draft: number;
	territories: number;
	measures: Figures[];
	wrote: {
		draft: number;
		territories: number;
		/** digests of the carried figures by measure */
		measures: Record<string, string>;
	};
}

export const beforeOf = (row: Pick<HeldRecut | RecutRecord, 'before'>): Before | null =>
	row.before as unknown as Before | null;

export const figuresOf = (row: MeasureRow): Figures => ({
	...{ id: row.id, name: row.name, table: row.table_id },
	...{ values: row.values, texts: row.texts },
});

/** The same for the same figures in the same order. */
export const figuresDigest = ({ values, texts }: Pick<Figures, 'values' | 'texts'>): string =>
	createHash('sha256')
		.update(JSON.stringify([values, texts]))
		.digest('hex');
