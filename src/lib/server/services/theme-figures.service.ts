import type { ThemeMeasure } from '../../schemas/desk-theme.ts';
import { mayDo, requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { readMeasuresNamed } from '../repositories/measures.repository.ts';
import { sheetOf } from './draft.service.ts';
import { deskMeasures } from './measures.service.ts';

/**
 * The figures that a theme can be made of, with the day that each was taken over. Null for members who may
 * not see figures: what the sheet shows of them comes with the sheet, as classes.
 */
export async function themeMeasures(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
): Promise<ThemeMeasure[] | null> {
	requireAccess(member, 'sheet.read');
	if (!mayDo(member, 'measures.read')) return null;
	const { measures } = await deskMeasures(shop, member, number);
	if (measures.length === 0) return [];
	const sheet = await sheetOf(shop.db, member, number);
	const dates = await readMeasuresNamed(
		shop.db,
		sheet.id,
		measures.map(({ name }) => name),
	);
	const takenAt = new Map(dates.map(({ name, taken_at }) => [name, taken_at]));
	return measures.map((measure) => ({
		...measure,
		takenAt: takenAt.get(measure.name)?.toISOString() ?? null,
	}));
}
