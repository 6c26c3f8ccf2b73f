import type { DeskMeasure } from '../../schemas/desk-territories.ts';

/** A measure as programs see it, without its values. */
export const measureAnswer = (measure: DeskMeasure) => ({
	name: measure.name,
	unit: measure.unit,
	table: measure.table,
	total: measure.total,
	missing: measure.missing,
	confidential: measure.confidential,
	stale: measure.stale,
});
