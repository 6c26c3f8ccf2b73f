import { promisify } from 'node:util';
import { gzip } from 'node:zlib';
import { mostWhole, sheetApart } from '../../schemas/sheet-apart.ts';
import { encodeColumns } from '../../schemas/sheet-columns.ts';
import type { DeskSheet, DeskSheetApart } from '../../schemas/desk.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { boundaryView, type BoundaryView } from './boundary-view.ts';
import { sheetOf } from './draft.service.ts';
import { firstPictureTag } from './first-picture-tag.ts';
import { deskSheet } from './sheet.service.ts';

type Reading = Pick<Workshop, 'db'>;

/** A sheet as its page is given it: of a large one the regions and borders are fetched apart, once. */
export async function sheetForPage(
	shop: Reading,
	member: Member,
	number: number,
): Promise<DeskSheet | DeskSheetApart> {
	const sheet = await deskSheet(shop, member, number);
	if (sheet.regions.key.length <= mostWhole) return sheet;
	return sheetApart(sheet, firstPictureTag(sheet));
}

/** Packed once and kept as long as the view it was made of. */
const packed = new WeakMap<BoundaryView, Promise<Buffer>>();

/** Regions and borders, encoded and gzipped, under the boundary set's id: they never change. */
export async function sheetColumns(
	shop: Reading,
	member: Member,
	number: number,
): Promise<{ tag: string; read(): Promise<Buffer> }> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	return {
		tag: `${sheet.boundary_set_id}-columns`,
		async read() {
			const view = await boundaryView(shop.db, sheet.boundary_set_id);
			const known = packed.get(view) ?? pack(view);
			packed.set(view, known);
			return known;
		},
	};
}

const pack = ({
	keys,
	names,
	parts,
	areasKm2,
	enclaveOf,
	borders,
}: BoundaryView): Promise<Buffer> =>
	promisify(gzip)(
		encodeColumns({
			regions: { key: keys, name: names, parts, areaKm2: areasKm2, enclaveOf },
			borders,
		}),
		{ level: 3 },
	);
