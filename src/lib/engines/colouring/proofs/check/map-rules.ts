import type { ProofFile } from '../proof-form.ts';

/** What a claim may lean on: the map and rules of its file, in a shape for looking up. */
export interface MapRules {
	file: ProofFile;
	lock: ReadonlyMap<number, number>;
	/** whether a reserved ink is barred from a region; with `locks` as those that stand */
	barred: (region: number, ink: number) => boolean;
}

/** The rules of a file when the locks of some regions are dropped. */
export function rulesWithout(file: ProofFile, dropped: readonly number[] = []): MapRules {
	const gone = new Set(dropped);
	const lock = new Map(file.rules.locks.filter(([region]) => !gone.has(region)));
	const reserved = new Set(file.rules.reserved);
	const holders = reserved.size > 0 ? holdersOf(file, lock, reserved) : new Set<string>();
	const root = reserved.size > 0 ? rootsOf(file) : null;
	const barred = (region: number, ink: number) =>
		root !== null && reserved.has(ink) && !holders.has(`${root[region]} ${ink}`);
	return { file, lock, barred };
}

/** "root ink" for every group of regions kept alike in which one is locked to a reserved ink. */
function holdersOf(file: ProofFile, lock: ReadonlyMap<number, number>, reserved: Set<number>) {
	const root = rootsOf(file);
	const holders = new Set<string>();
	for (const [region, ink] of lock) if (reserved.has(ink)) holders.add(`${root[region]} ${ink}`);
	return holders;
}

/** One region for each group that is kept alike, by walking along the pairs. */
function rootsOf({ regions, rules }: ProofFile): Int32Array {
	const near = new Map<number, number[]>();
	const join = (a: number, b: number) => {
		const list = near.get(a);
		if (list) list.push(b);
		else near.set(a, [b]);
	};
	for (const [a, b] of rules.alike) {
		join(a, b);
		join(b, a);
	}
	const root = new Int32Array(regions.length).fill(-1);
	for (let start = 0; start < root.length; start++) {
		if (root[start] >= 0) continue;
		root[start] = start;
		for (const waiting = [start]; waiting.length > 0;) {
			for (const next of near.get(waiting.pop() as number) ?? []) {
				if (root[next] >= 0) continue;
				root[next] = start;
				waiting.push(next);
			}
		}
	}
	return root;
}
