import type { TableNote } from '../../engines/measures/index.ts';
import type { RegionName } from '../../schemas/measure-review.ts';

export interface Names {
	keys: string[];
	names: string[];
}

export const regionName = ({ keys, names }: Names, region: number): RegionName => ({
	key: keys[region],
	name: names[region] || keys[region],
});

/** A note's message with names for the regions it means; only such a message holds marks like #12. */
export const sentenceOf = ({ message, regions: meant }: TableNote, regions: Names): string =>
	meant.length === 0
		? message
		: message.replace(/#(\d+)/g, (mark, number) =>
				Number(number) in regions.keys ? regionName(regions, Number(number)).name : mark,
			);

const digits = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 2 });
/** A figure within a sentence: 12,480.5 */
export const figure = (value: number): string => digits.format(value);
