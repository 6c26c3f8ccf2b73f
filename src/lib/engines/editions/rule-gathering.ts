import { differentPairs, mostDifferent, mostDifferentPairs, type GroupRule } from './draft.ts';
import { ruleLimits } from './rule-limits.ts';
import { noRules, type RuleParts } from './rule-parts.ts';
import { inQuotes, LineFault } from './rules-csv-cells.ts';
import { unguarded } from './rules-csv-write.ts';

interface GatheredGroup {
	group: GroupRule;
	keys: Set<string>;
	/** row that named it first */
	row: number;
}

/** Puts rules together one by one, each once, within the limits of a draft. */
export class RuleGathering {
	private readonly parts: RuleParts = noRules();
	private readonly locks = new Map<string, { ink: number; cost: number }>();
	private readonly groups = new Map<string, GatheredGroup>();
	private readonly seen = new Set<string>();

	lock(key: string, ink: number, cost: number): void {
		const known = this.locks.get(key);
		if (known && (known.ink !== ink || known.cost !== cost)) {
			throw new LineFault(`${inQuotes(key)} has another lock already`);
		}
		this.locks.set(key, { ink, cost });
	}

	forbid(key: string, ink: number): void {
		if (this.isNew('forbidden', key, ink)) this.push('forbidden', { key, ink });
	}

	pair(kind: 'alike' | 'apart', a: string, b: string): void {
		if (a === b) throw new LineFault('a region is paired with itself');
		const [low, high] = a < b ? [a, b] : [b, a];
		if (this.isNew(kind, low, high)) this.push(kind, [a, b]);
	}

	group(kind: GroupRule['kind'], cell: string, key: string, row: number): void {
		const name = unguarded(cell);
		if (name === '') throw new LineFault('the group has no name');
		if (name.length > ruleLimits.groupName) {
			throw new LineFault(`the name of a group has at most ${ruleLimits.groupName} characters`);
		}
		const id = JSON.stringify([kind, name]);
		const known = this.groups.get(id) ?? this.newGroup(id, { kind, name, keys: [] }, row);
		const most = kind === 'alike' ? ruleLimits.rules : mostDifferent;
		if (known.keys.size >= most && !known.keys.has(key)) {
			throw new LineFault(`at most ${most} regions can be in the group ${inQuotes(name)}`);
		}
		known.keys.add(key);
	}

	reserve(ink: number): void {
		if (!this.isNew('reserved', ink)) return;
		if (this.parts.reserved.length >= ruleLimits.reserved) {
			throw new LineFault(`at most ${ruleLimits.reserved} inks can be reserved`);
		}
		this.parts.reserved.push(ink);
	}

	/** What was gathered; `late`: faults that can be told only at the end. */
	done(): { parts: RuleParts; late: { row: number; words: string }[] } {
		const late: { row: number; words: string }[] = [];
		const groups: GroupRule[] = [];
		let pairs = 0;
		for (const { group, keys, row } of this.groups.values()) {
			const whole = { ...group, keys: [...keys] };
			pairs += differentPairs([whole]);
			if (keys.size < 2) {
				late.push({ row, words: `the group ${inQuotes(group.name)} has one region only` });
			} else if (group.kind === 'different' && pairs > mostDifferentPairs) {
				late.push({ row, words: 'groups in which all differ come to too many pairs' });
			} else groups.push(whole);
		}
		const locks = Object.fromEntries(this.locks);
		return { parts: { ...this.parts, locks, groups }, late };
	}

	private newGroup(id: string, group: GroupRule, row: number): GatheredGroup {
		if (this.groups.size >= ruleLimits.groups) {
			throw new LineFault(`at most ${ruleLimits.groups} groups are taken`);
		}
		const made = { group, keys: new Set<string>(), row };
		this.groups.set(id, made);
		return made;
	}

	private push<K extends 'forbidden' | 'alike' | 'apart'>(part: K, rule: RuleParts[K][number]) {
		const list: RuleParts[K][number][] = this.parts[part];
		if (list.length >= ruleLimits.rules) {
			throw new LineFault(`at most ${ruleLimits.rules} rules of this kind are taken`);
		}
		list.push(rule);
	}

	private isNew(...rule: unknown[]): boolean {
		return this.seen.size < this.seen.add(JSON.stringify(rule)).size;
	}
}
