import type { ProofFile } from '../proof-form.ts';
import { limits } from './limits.ts';
import { readClaim } from './read-claim.ts';
import {
	fieldFault,
	isRecord,
	isWhole,
	listFault,
	pairsFault,
	quoted,
	type Fault,
} from './read-values.ts';

/**
 * Whether a value has the form of a proof file, looked at field by field; it may come from anybody. Out:
 * the first thing that is wrong, in words, or the same value as a file.
 */
export function readFile(input: unknown): { fault: string } | { file: ProofFile } {
	const fault = formFault(input) ?? mapFault(input as Parts) ?? claimsFault(input as Parts);
	return fault ? { fault } : { file: input as ProofFile };
}

type Parts = Record<'regions' | 'borders' | 'rules' | 'claims', unknown>;

function formFault(input: unknown): Fault {
	if (!isRecord(input)) return 'The file is not a proof file: it holds no fields.';
	if (!Object.hasOwn(input, 'form') || input.form !== 'merestone proof 1') {
		return 'The file is not of the form “merestone proof 1”.';
	}
	return fieldFault(input, 'The file', ['form', 'regions', 'borders', 'rules', 'claims']);
}

function mapFault({ regions, borders, rules }: Parts): Fault {
	const keys = new Set<string>();
	const fault = listFault(regions, 'The list of regions', limits.regions, (region, at) =>
		regionFault(region, at, keys),
	);
	if (fault) return fault;
	const count = (regions as unknown[]).length;
	return (
		pairsFault(borders, 'The list of borders', [count, count], false) ?? rulesFault(rules, count)
	);
}

function regionFault(region: unknown, at: string, keys: Set<string>): Fault {
	if (!isRecord(region)) return `${at} is no region.`;
	const fault = fieldFault(region, at, ['key'], ['name']);
	if (fault) return fault;
	const { key } = region;
	if (typeof key !== 'string' || key.length > limits.name) return `${at} has no proper key.`;
	if (keys.has(key)) return `${at} has the key “${quoted(key)}” that another region has.`;
	keys.add(key);
	if (!Object.hasOwn(region, 'name')) return null;
	const { name } = region;
	return typeof name === 'string' && name.length <= limits.name
		? null
		: `${at} has no proper name.`;
}

function rulesFault(rules: unknown, regions: number): Fault {
	if (!isRecord(rules)) return 'The rules are no fields.';
	const both = [regions, regions] as const;
	const withInk = [regions, limits.inks] as const;
	return (
		fieldFault(rules, 'The rules', ['locks', 'forbidden', 'alike', 'apart', 'reserved']) ??
		pairsFault(rules.locks, 'The list of locks', withInk, true) ??
		lockedTwice(rules.locks as [number, number][]) ??
		pairsFault(rules.forbidden, 'The list of forbidden inks', withInk, true) ??
		pairsFault(rules.alike, 'The list of regions kept alike', both, true) ??
		pairsFault(rules.apart, 'The list of regions kept apart', both, false) ??
		listFault(rules.reserved, 'The list of reserved inks', limits.inks, (ink, at) =>
			isWhole(ink, limits.inks) ? null : `${at} is no ink.`,
		)
	);
}

function lockedTwice(locks: readonly (readonly [number, number])[]): Fault {
	const locked = new Set(locks.map(([region]) => region));
	return locked.size === locks.length ? null : 'A region is locked twice.';
}

function claimsFault({ claims, regions }: Parts): Fault {
	const count = (regions as unknown[]).length;
	const fault = listFault(claims, 'The list of claims', limits.claims, (claim, at) =>
		readClaim(claim, at, count),
	);
	if (fault) return fault;
	return (claims as unknown[]).length === 0 ? 'The file claims nothing.' : null;
}
