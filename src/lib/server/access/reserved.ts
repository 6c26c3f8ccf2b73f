/** First words of addresses that belong to the product and so cannot be a team's. */
export const reservedWords: ReadonlySet<string> = new Set([
	...[
		'account',
		'admin',
		'api',
		'app',
		'auth',
		'booth',
		'demo',
		'docs',
		'handover',
		'health',
		'help',
	],
	...['invitation', 'mail', 'merestone', 'metrics', 'new', 'settings', 'shared', 'sheets'],
	...['sign-in', 'sign-out', 'sign-up', 'static', 'support', 'team', 'teams', 'terms', 'privacy'],
]);

const SLUG = /^[a-z0-9][a-z0-9-]{1,48}$/;

/** Whether an address of this form can be a team's at all. */
export const isTeamSlug = (word: string): boolean => SLUG.test(word) && !reservedWords.has(word);

/**
 * The word under which a team of this name stands in addresses.
 * @param place 1 for the first try, then 2, 3, ... while the words are taken
 */
export function slugFor(name: string, place = 1): string {
	const plain = name
		.normalize('NFKD')
		.replace(/\p{M}/gu, '')
		.toLowerCase()
		.replace(/[^a-z0-9]+/g, '-')
		.replace(/^-+|-+$/g, '')
		.slice(0, 40)
		.replace(/-+$/, '');
	const word = isTeamSlug(plain) ? plain : `team-${plain}`.replace(/-$/, '');
	const numbered = place === 1 ? word : `${word}-${place}`;
	return isTeamSlug(numbered) ? numbered : `${word}-1`;
}
