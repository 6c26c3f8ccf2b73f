import type { Coverage } from '../coverage.ts';
import { areaFaults } from './check-areas.ts';
import type { MatchGroup, RegionMatch } from './region-match.ts';

/**
 * What is wrong with a match, in plain sentences; empty when it holds. Shares no code with its maker.
 *
 * Checked in full: every region of either coverage is in exactly one group; groups say what their members
 * say; joining links hold each group together and none leads out of it; shares and areas agree with each
 * other. Checked by another way of cutting polygons (Turf), for up to `sample` regions of either side
 * evenly taken: the share of every pair that may have ground in common, listed or not (but see `areaFaults`
 * for what is left out). Shares may differ by a hundredth: areas are told on a sphere there.
 */
export function checkMatch(
	before: Coverage,
	after: Coverage,
	match: RegionMatch,
	{ sample = 200 }: { sample?: number } = {},
): string[] {
	const shape = [...sideFaults(before, match.before), ...sideFaults(after, match.after)];
	if (shape.length > 0) return shape;
	const faults = [...memberFaults(match), ...linkFaults(match)];
	if (faults.length > 0) return faults;
	return [
		...groupFaults(match),
		...unionFaults(match),
		...areaFaults(before, after, match, sample),
	];
}

function sideFaults(coverage: Coverage, side: RegionMatch['before']): string[] {
	const isSame =
		side.keys.length === coverage.keys.length &&
		side.names.length === coverage.keys.length &&
		side.keys.every((key, i) => key === coverage.keys[i]) &&
		side.names.every((name, i) => name === coverage.names[i]) &&
		side.km2.every((km2, i) => km2 === coverage.areasKm2[i]);
	return isSame ? [] : ['The match is of other regions.'];
}

/** Every region once, in the group that the columns name. */
function* memberFaults({ groups, groupOfOld, groupOfNew, before, after }: RegionMatch) {
	for (const [side, column, regions] of [
		['before', groupOfOld, before.keys.length],
		['after', groupOfNew, after.keys.length],
	] as const) {
		const seen = new Uint8Array(regions);
		for (let group = 0; group < groups.length; group++) {
			const members = groups[group][side];
			for (let i = 0; i < members.length; i++) {
				if (!(members[i] in seen)) yield `Group ${group} names region ${members[i]} ${side}.`;
				else if (seen[members[i]]++) yield `Region ${members[i]} ${side} is in two groups.`;
				else if (column[members[i]] !== group)
					yield `The column ${side} leads past group ${group}.`;
				if (i > 0 && members[i] <= members[i - 1]) yield `Group ${group} is out of order.`;
			}
		}
		if (column.length !== regions || seen.includes(0)) yield `A region ${side} is in no group.`;
	}
}

function* linkFaults({ links, before, after }: RegionMatch) {
	const { from, to, km2, shareOfOld, shareOfNew, joins } = links;
	const lengths = [to, km2, shareOfOld, shareOfNew, joins].map(({ length }) => length);
	if (lengths.some((length) => length !== from.length)) {
		yield 'The columns of the links differ in length.';
		return;
	}
	for (let i = 0; i < from.length; i++) {
		const [a, b] = [before.km2[from[i]], after.km2[to[i]]];
		if (a === undefined || b === undefined) yield `Link ${i} leads to no region.`;
		if (i > 0 && (from[i] - from[i - 1] || to[i] - to[i - 1]) <= 0)
			yield `Link ${i} is out of order.`;
		const isShare = [shareOfOld[i], shareOfNew[i]].every((share) => share >= 0 && share <= 1);
		if (!isShare) yield `A share of link ${i} is not between 0 and 1.`;
		const off = Math.max(
			Math.abs(km2[i] - shareOfOld[i] * a),
			Math.abs(km2[i] - shareOfNew[i] * b),
		);
		if (!(off <= 0.01 * Math.max(a, b))) yield `The shares of link ${i} do not fit its area.`;
	}
}

function* groupFaults({ groups, before, after }: RegionMatch) {
	for (const [number, group] of groups.entries()) {
		const { outcome, by } = group;
		const isSameKey =
			group.before.length === 1 &&
			group.after.length === 1 &&
			before.keys[group.before[0]] === after.keys[group.after[0]];
		if (outcome !== expected(group, isSameKey)) yield `Group ${number} is not ${outcome}.`;
		if (by === 'key' && !isSameKey) yield `Group ${number} does not go by key.`;
		if (!group.words.endsWith('.')) yield `Group ${number} is not told in words.`;
	}
}

const names = [
	['', 'new', 'new'],
	['gone', '', 'split'],
	['gone', 'merged', 'redrawn'],
] as const;

function expected({ before, after }: MatchGroup, isSameKey: boolean): string {
	const name = names[Math.min(2, before.length)][Math.min(2, after.length)];
	return before.length === 1 && after.length === 1 ? (isSameKey ? 'kept' : 'renamed') : name;
}

/** Joining links stay within their group and reach all of it. */
function* unionFaults({ groups, groupOfOld, groupOfNew, links }: RegionMatch) {
	const near = new Map<string, string[]>();
	const join = (a: string, b: string) => {
		const known = near.get(a);
		if (known) known.push(b);
		else near.set(a, [b]);
	};
	for (let i = 0; i < links.from.length; i++) {
		if (!links.joins[i]) continue;
		const [a, b] = [`o${links.from[i]}`, `n${links.to[i]}`];
		if (groupOfOld[links.from[i]] !== groupOfNew[links.to[i]])
			yield `Link ${i} leads out of a group.`;
		join(a, b);
		join(b, a);
	}
	for (const [number, { before, after }] of groups.entries()) {
		const members = [...before.map((r) => `o${r}`), ...after.map((r) => `n${r}`)];
		const reached = new Set(members.slice(0, 1));
		for (const one of reached) for (const next of near.get(one) ?? []) reached.add(next);
		if (reached.size !== members.length) yield `Group ${number} does not hang together.`;
	}
}
