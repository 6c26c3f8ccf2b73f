import { mayDo, type Member } from '../access/member.ts';
import type { Row } from '../database/schema.ts';

/** The one who asked for a file stops it, and an admin, since open ones count against the whole team. */
export const mayStopExport = (
	member: Member,
	{ created_by: asker }: Pick<Row<'exports'>, 'created_by'>,
): boolean => (asker !== null && asker === member.userId) || mayDo(member, 'team.manage');
