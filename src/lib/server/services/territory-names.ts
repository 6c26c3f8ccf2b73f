/** Keys and names for territories that are made by the product. */

/** A key made of a name: small letters, figures and hyphens, not among those taken. */
export function freshKey(name: string, taken: Set<string>): string {
	const stem =
		name
			.normalize('NFKD')
			.replace(/\p{M}+/gu, '')
			.toLowerCase()
			.replace(/[^a-z0-9]+/g, '-')
			.replace(/^-+|-+$/g, '')
			.slice(0, 60) || 'territory';
	return unused(stem, taken, '-');
}

/** The name itself, or with a number where it is taken. */
export const freshName = (name: string, taken: Set<string>): string =>
	unused(name.slice(0, 110), taken, ' ');

function unused(stem: string, taken: Set<string>, joint: string): string {
	let made = stem;
	for (let n = 2; taken.has(made); n++) made = `${stem}${joint}${n}`;
	taken.add(made);
	return made;
}
