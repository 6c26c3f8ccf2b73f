import type { Message } from './transport.ts';

/** The mails that Merestone sends, in plain text. */

export function signInMail(to: string, link: string, minutes: number): Message {
	return {
		to,
		subject: 'Your sign-in link for Merestone',
		text: [
			'This link signs you in to Merestone:',
			link,
			`It works once, within ${minutes} minutes. If you did not ask for it, do nothing: nobody can sign in without it.`,
		].join('\n\n'),
	};
}

export function invitationMail(invitation: {
	to: string;
	inviter: string;
	team: string;
	roles: readonly string[];
	link: string;
}): Message {
	const { to, inviter, team, roles, link } = invitation;
	return {
		to,
		subject: `${inviter} invites you to the map team ${team}`,
		text: [
			`${inviter} invites you to work in the team ${team} on Merestone, as ${roles.join(', ')}.`,
			'Accept here:',
			link,
			'The link works once, within 14 days. If you do not know the sender, do nothing.',
		].join('\n\n'),
	};
}
