import type { Db } from '../database/connection.ts';

/** So many layouts of one boundary set are kept; each can be made again. */
const mostOfASet = 8;

export async function readFirstPicture(
	db: Db,
	boundarySetId: string,
	tag: string,
): Promise<Buffer | undefined> {
	const row = await db
		.selectFrom('first_pictures')
		.select('picture')
		.where('boundary_set_id', '=', boundarySetId)
		.where('tag', '=', tag)
		.executeTakeFirst();
	return row?.picture;
}

/** Keeps a picture and lets the oldest ones go. The same picture made twice is kept once. */
export async function keepFirstPicture(
	trx: Db,
	boundarySetId: string,
	tag: string,
	picture: Uint8Array,
): Promise<void> {
	await trx
		.insertInto('first_pictures')
		.values({ boundary_set_id: boundarySetId, tag, picture: Buffer.from(picture) })
		.onConflict((conflict) => conflict.doNothing())
		.execute();
	const kept = trx
		.selectFrom('first_pictures')
		.select('tag')
		.where('boundary_set_id', '=', boundarySetId)
		.orderBy('made_at', 'desc')
		.limit(mostOfASet);
	await trx
		.deleteFrom('first_pictures')
		.where('boundary_set_id', '=', boundarySetId)
		.where('tag', 'not in', kept)
		.execute();
}
