import { limits } from './limits.ts';

/** What is wrong with a value, in words; null when nothing is. */
export type Fault = string | null;

export const isRecord = (value: unknown): value is Record<string, unknown> =>
	typeof value === 'object' && value !== null && !Array.isArray(value);

export const isWhole = (value: unknown, below: number): value is number =>
	typeof value === 'number' && Number.isInteger(value) && value >= 0 && value < below;

/** Shortened and without characters that could turn a sentence around, for faults and sentences. */
export function quoted(text: string, most = 60): string {
	const plain = text.slice(0, 4 * most).replace(/[\p{C}\p{Zl}\p{Zp}]/gu, ' ');
	return plain.length > most ? `${plain.slice(0, most)}…` : plain;
}

/** Every field must be known, and those in `needed` must be there; inherited ones do not count. */
export function fieldFault(
	record: Record<string, unknown>,
	where: string,
	needed: readonly string[],
	optional: readonly string[] = [],
): Fault {
	for (const field in record) {
		if (!needed.includes(field) && !optional.includes(field)) {
			return `${where} has the field “${quoted(field)}”, which this form does not know.`;
		}
	}
	const missing = needed.find((field) => !Object.hasOwn(record, field));
	return missing === undefined ? null : `${where} lacks the field “${missing}”.`;
}

/** A list of at most so many, every one without fault. */
export function listFault(
	value: unknown,
	where: string,
	most: number,
	one: (entry: unknown, where: string) => Fault,
): Fault {
	if (!Array.isArray(value)) return `${where} is not a list.`;
	if (value.length > most) return `${where} has more than ${most.toLocaleString('en')} entries.`;
	for (let i = 0; i < value.length; i++) {
		const fault = one(value[i], `${where}, entry ${i + 1},`);
		if (fault) return fault;
	}
	return null;
}

/** A list of pairs of whole numbers below the two given; two of the same when `apart` forbids it. */
export function pairsFault(
	value: unknown,
	where: string,
	below: readonly [number, number],
	loops: boolean,
): Fault {
	return listFault(value, where, limits.pairs, (entry, at) => {
		if (!Array.isArray(entry) || entry.length !== 2) return `${at} is not a pair.`;
		const [a, b] = entry as unknown[];
		if (!isWhole(a, below[0]) || !isWhole(b, below[1])) return `${at} names what does not exist.`;
		return a === b && !loops ? `${at} pairs a region with itself.` : null;
	});
}

/** A list of different region numbers. */
export function regionsFault(value: unknown, where: string, regions: number): Fault {
	const seen = new Set<number>();
	return listFault(value, where, limits.regions, (entry, at) => {
		if (!isWhole(entry, regions)) return `${at} names a region that does not exist.`;
		if (seen.has(entry)) return `${at} names a region twice.`;
		seen.add(entry);
		return null;
	});
}
