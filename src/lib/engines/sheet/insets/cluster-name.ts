import { cleanText } from '../type/clean-text.ts';
import type { Coverage } from '../../boundaries/coverage.ts';
import { latitudeWords, longitudeWords } from '../plane/degrees.ts';
import { wrapLon } from '../plane/extent.ts';
import type { Cluster } from './clusters.ts';

/**
 * What a group of parts is called: the name of its regions, of the level above where they share it, or
 * `part of` the one region whose main part lies elsewhere.
 */
export function clusterName(
	{ names, areasKm2 }: Pick<Coverage, 'names' | 'areasKm2'>,
	groups: (string | null)[],
	{ regions }: Pick<Cluster, 'regions'>,
): string {
	const [first, ...others] = regions;
	const part = (one: Cluster['regions'][number]) =>
		one.areaKm2 < areasKm2[one.region] / 2 ? `part of ${names[one.region]}` : names[one.region];
	if (!others.length) return part(first);
	const group = groups[first.region];
	if (group && others.every(({ region }) => groups[region] === group)) return group;
	if (others.length === 1) return `${part(first)} and ${part(others[0])}`;
	return `${part(first)} and ${others.length} more`;
}

/** Where a group lies, to a degree: ` (79° N 20° E)`. */
export const whereabouts = ({ at: [lon, lat] }: Pick<Cluster, 'at'>): string =>
	` (${latitudeWords(Math.round(lat))} ${longitudeWords(wrapLon(Math.round(lon)))})`;

/**
 * What stands over each inset: the name that was given, else what the group is called; where several are
 * called alike, with the place of each.
 */
export function insetNames(
	coverage: Pick<Coverage, 'names' | 'areasKm2'>,
	groups: (string | null)[],
	clusters: Cluster[],
	choices: Record<string, { name: string | null }>,
): string[] {
	const called = clusters.map((one) => clusterName(coverage, groups, one));
	return clusters.map((one, i) => {
		const own = choices[one.id]?.name;
		const alike = called.filter((other) => other === called[i]).length > 1;
		return cleanText(own || (alike ? called[i] + whereabouts(one) : called[i]));
	});
}
