import type { Claim, Evidence, ProofFile } from '../proof-form.ts';
import { quoted } from './read-values.ts';

const plural = (count: number, noun: string) =>
	`${count.toLocaleString('en')} ${noun}${count === 1 ? '' : 's'}`;

export const countedInks = (inks: number): string => plural(inks, 'ink');

/** How a region is called in sentences: its name, else its key. */
export const nameIn = (file: ProofFile) => (region: number) => {
	const { key, name } = file.regions[region];
	return quoted(name || key);
};

/** The first names of a list, and how many more. */
function listed(file: ProofFile, regions: readonly number[], most = 6): string {
	const names = regions.slice(0, most).map(nameIn(file));
	if (regions.length > most) return `${names.join(', ')} and ${regions.length - most} more`;
	return names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}

/** What the file is about: "49 regions with 107 borders, 2 locks and 1 forbidden ink". */
export function mapSentence({ regions, borders, rules }: ProofFile): string {
	const counts = [
		[borders.length, 'border'],
		[rules.locks.length, 'lock'],
		[rules.forbidden.length, 'forbidden ink'],
		[rules.alike.length, 'pair kept alike', 'pairs kept alike'],
		[rules.apart.length, 'pair kept apart', 'pairs kept apart'],
		[rules.reserved.length, 'reserved ink'],
	] as const;
	const parts = counts
		.filter(([count]) => count > 0)
		.map(([count, one, many]) => (many && count > 1 ? `${count} ${many}` : plural(count, one)));
	const rest = parts.length > 1 ? `${parts.slice(0, -1).join(', ')} and ${parts.at(-1)}` : parts[0];
	return `The file is about ${plural(regions.length, 'region')}${rest ? ` with ${rest}` : ''}.`;
}

/** A claim as the end of "that …". */
export function claimed(file: ProofFile, claim: Claim): string {
	switch (claim.claim) {
		case 'inks do':
			return `with ${countedInks(claim.inks)} every border and every rule can be kept`;
		case 'inks do not':
			return `with ${countedInks(claim.inks)} or fewer they cannot all be kept`;
		case 'works without':
			return `with ${countedInks(claim.inks)} everything can be kept once the ${locksOf(file, claim.locks)} dropped`;
		case 'cannot be kept': {
			const inks = claim.inks === 'any' ? 'any number of inks' : countedInks(claim.inks);
			const what =
				claim.locks.length === 0
					? 'the rules and borders, even without any lock,'
					: `the ${claim.locks.length === 1 ? 'lock' : 'locks'} of ${listed(file, claim.locks)}`;
			return `with ${inks} ${what} cannot be kept together with the borders and the other rules`;
		}
	}
}

const locksOf = (file: ProofFile, locks: readonly number[]) =>
	locks.length === 1 ? `lock of ${listed(file, locks)} is` : `locks of ${listed(file, locks)} are`;

/** The evidence by the regions it names. */
export function shapeWords(file: ProofFile, { kind, regions }: Evidence): string {
	const names = listed(file, regions);
	switch (kind) {
		case 'one region':
			return `there being a region, ${names}`;
		case 'clique':
			return regions.length === 2
				? `the border of ${names}`
				: `${plural(regions.length, 'region')} that all border each other (${names})`;
		case 'odd ring':
			return `a ring of ${plural(regions.length, 'region')} (${names})`;
		case 'odd wheel':
			return `a ring of ${plural(regions.length - 1, 'region')} round ${nameIn(file)(regions[0])} (${listed(file, regions.slice(1))})`;
		case 'clauses':
			return `${plural(regions.length, 'region')} (${names})`;
	}
}
