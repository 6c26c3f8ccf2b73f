import {
	carryPins,
	quoted,
	type CarriedRow,
	type CarryGround,
	type PairTest,
	type Pin,
} from '../boundaries/recut/index.ts';
import type { Draft } from './draft.ts';
import { inkName } from './ink-name.ts';

type Locks = Draft['locks'];

/**
 * Locks on the new regions, as `carryPins` says: not on pieces that would touch a larger one with the
 * same lock, for such neighbours could not be coloured, and not where another part has a ban on the ink.
 */
export function carryLocks(
	ground: CarryGround,
	draft: Draft,
	forbidden: Draft['forbidden'],
	mustDiffer: PairTest | null,
): { locks: Locks; rows: CarriedRow[] } {
	const bans = new Set(forbidden.map(({ key, ink }) => `${ink} ${key}`));
	const pins = Object.entries(draft.locks).map(([key, value]) => ({ key, value }));
	const carried = carryPins(ground, pins, {
		said: (pin) => ({ what: 'lock', keys: [pin.key], subject: subjectOf(pin, draft) }),
		code: ({ ink }) => ink,
		collide: mustDiffer,
		against: (fresh, { ink }) =>
			bans.has(`${ink} ${ground.key(fresh)}`)
				? `another part of ${quoted(ground.key(fresh))} may not have this ink`
				: null,
	});
	const entries = carried.pins.map(({ key, value }) => [key, { ...value }] as const);
	return { locks: Object.fromEntries(entries), rows: carried.rows };
}

const subjectOf = ({ key, value }: Pin<Locks[string]>, draft: Draft) =>
	`The lock of ${quoted(key)} on ${inkName(draft, value.ink)}`;
