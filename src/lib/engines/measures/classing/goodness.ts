import { classOf } from './class-of.ts';
import { mean } from './moments.ts';

/**
 * Goodness of variance fit: the share of the values' squared deviation that the classes account for, 0 to
 * 1; 1 where every class holds one value only. In: one finite value or more.
 * Source: Jenks and Caspall 1971, Annals of the AAG 61(2) 217-244.
 */
export function varianceFit(values: readonly number[], limits: readonly number[]): number {
	const groups = Array.from({ length: limits.length + 1 }, (): number[] => []);
	for (const value of values) groups[classOf(value, limits)].push(value);
	const within = groups.reduce((sum, group) => sum + squares(group), 0);
	const all = squares(values);
	return all > 0 ? Math.max(0, 1 - within / all) : 1;
}

function squares(values: readonly number[]): number {
	const centre = mean(values);
	return values.reduce((sum, value) => sum + (value - centre) ** 2, 0);
}
