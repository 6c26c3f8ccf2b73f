import type { Db } from '../database/connection.ts';
import type { NewRow } from '../database/schema.ts';

export async function insertActivity(db: Db, entry: NewRow<'activity'>): Promise<void> {
	await db.insertInto('activity').values(entry).execute();
}

export interface ActivityFilter {
	/** the first word of the action, such as `member` for `member.invited` */
	kind: string | null;
	userId: string | null;
}

const filtered = (db: Db, teamId: string, { kind, userId }: ActivityFilter) => {
	let query = db.selectFrom('activity').where('activity.team_id', '=', teamId);
	if (kind) query = query.where('activity.action', 'like', `${kind.replace(/[\\%_]/g, '\\$&')}.%`);
	if (userId) query = query.where('activity.user_id', '=', userId);
	return query;
};

/** One page of a team's entries, the latest first. */
export const listActivity = (
	db: Db,
	teamId: string,
	filter: ActivityFilter,
	page: { offset: number; limit: number },
) =>
	filtered(db, teamId, filter)
		.leftJoin('User', 'User.id', 'activity.user_id')
		.leftJoin('api_tokens', 'api_tokens.id', 'activity.token_id')
		.select(['activity.id', 'at', 'action', 'subject_kind', 'subject_id', 'detail'])
		.select(['User.name as userName', 'User.email as userEmail', 'api_tokens.name as tokenName'])
		.orderBy('activity.id', 'desc')
		.offset(page.offset)
		.limit(page.limit)
		.execute();

export async function countActivity(
	db: Db,
	teamId: string,
	filter: ActivityFilter,
): Promise<number> {
	const { count } = await filtered(db, teamId, filter)
		.select((eb) => eb.fn.countAll<number>().as('count'))
		.executeTakeFirstOrThrow();
	return count;
}

/** The first words of the actions that occur in this team, for the filter's choices. */
export async function activityKinds(db: Db, teamId: string): Promise<string[]> {
	const rows = await db
		.selectFrom('activity')
		.select((eb) => eb.fn<string>('split_part', ['action', eb.val('.'), eb.val(1)]).as('kind'))
		.where('team_id', '=', teamId)
		.distinct()
		.orderBy('kind')
		.execute();
	return rows.map((row) => row.kind);
}
