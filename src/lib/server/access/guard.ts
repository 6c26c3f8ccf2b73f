import { error, redirect } from '@sveltejs/kit';
import { mayDo, type Member } from './member.ts';
import type { Action } from './roles.ts';

/** The first line of every load, action and handler below a team: who acts, if they may do this. */
export function memberFor(locals: App.Locals, action: Action): Member {
	userFor(locals);
	if (!locals.member) error(404, 'There is no such team here.');
	if (!mayDo(locals.member, action)) error(403, 'Your roles in this team do not include this.');
	return locals.member;
}

/** The same for pages about a person rather than a team. */
export function userFor(locals: App.Locals): NonNullable<App.Locals['user']> {
	if (!locals.user) redirect(303, locals.signInAt ?? '/sign-in');
	return locals.user;
}
