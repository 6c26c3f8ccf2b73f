import type { SheetRow } from '../sheet/index.ts';
import type { ExtraColumn } from './source.ts';

/** Properties of a region that every file of boundaries has; further columns come after them. */
export const ownProperties = ['key', 'name', 'group', 'inkNumber', 'inkName', 'hex'] as const;

/**
 * What a region's feature says: its key, name, level above, the ink's number from 1 as in the legend,
 * its name and hex digits, then the further columns. Throws RangeError where a column takes the name of
 * another, a programmer's error.
 */
export function propertiesOf(
	row: SheetRow,
	columns: readonly ExtraColumn[],
): Record<string, string | number | null> {
	const properties: Record<string, string | number | null> = {};
	for (const name of ownProperties) properties[name] = row[name];
	for (const { id, values } of columns) {
		if (Object.hasOwn(properties, id)) throw new RangeError(`two columns named ${id}`);
		const value = values[row.region];
		properties[id] = typeof value === 'number' && !Number.isFinite(value) ? null : value;
	}
	return properties;
}
