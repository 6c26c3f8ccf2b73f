import { extremes } from './moments.ts';

/**
 * Upper values of classes that are equally wide, from the least value to the greatest. In: one finite
 * value or more. Out: `classes` values ascending; all the same where the values are.
 */
export function equalSteps(values: readonly number[], classes: number): number[] {
	const { least, most } = extremes(values);
	return Array.from({ length: classes }, (_, i) =>
		i === classes - 1 ? most : least + ((most - least) * (i + 1)) / classes,
	);
}
