import { mean } from './moments.ts';

/** Where the head is no minority any more, the values are not heavy-tailed and are parted no further. */
const mostHead = 0.4;

/**
 * Limits at the mean, the mean of what lies above it, and so on, while those above are a minority. For
 * figures with few large and many small; others come out in two classes.
 *
 * In: one finite value or more; the most classes. Out: limits ascending, at least one where two values
 * differ. Source: Jiang 2013, The Professional Geographer 65(3) 482-494; 40 percent as there.
 */
export function headTail(values: readonly number[], classes: number): number[] {
	const limits: number[] = [];
	let rest = [...values];
	while (limits.length < classes - 1 && rest.length > 1) {
		const limit = mean(rest);
		const head = rest.filter((value) => value > limit);
		if (head.length === 0 || (limits.length > 0 && head.length > mostHead * rest.length)) break;
		limits.push(limit);
		rest = head;
	}
	return limits;
}
