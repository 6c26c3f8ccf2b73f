import { alikeGroups } from './alike-groups.ts';
import type { ColouringProblem } from './problem.ts';

/**
 * Inks that only those have who are locked to them: one flag an ink and one ink a vertex, however many
 * vertices there are. A vertex stands for one region or for several that are kept alike.
 */
export class ReservedInks {
	/** each once, ascending */
	readonly inks: readonly number[];
	private readonly isReserved: Uint8Array;
	/** the reserved ink each vertex is locked to, -1 for none */
	private readonly own: Int32Array;
	/** further ones, where locks of regions kept alike contradict each other */
	private readonly more = new Map<number, number[]>();

	constructor(
		reserved: readonly number[],
		vertices: number,
		locks: Int32Array | undefined,
		vertexOf: ArrayLike<number>,
	) {
		this.inks = [...new Set(reserved)].sort((a, b) => a - b);
		this.isReserved = new Uint8Array((this.inks.at(-1) ?? -1) + 1);
		for (const ink of this.inks) this.isReserved[ink] = 1;
		this.own = new Int32Array(vertices).fill(-1);
		locks?.forEach((ink, region) => {
			if (ink >= 0 && this.isReserved[ink]) this.open(vertexOf[region], ink);
		});
	}

	/** Whether the ink is reserved and the vertex not locked to it. */
	keptFrom(v: number, ink: number): boolean {
		if (!this.isReserved[ink] || this.own[v] === ink) return false;
		return this.more.size === 0 || !this.more.get(v)?.includes(ink);
	}

	/** How many reserved inks below `inks` the vertex is locked to. */
	opened(v: number, inks: number): number {
		if (this.own[v] < 0) return 0;
		return [this.own[v], ...(this.more.get(v) ?? [])].filter((ink) => ink < inks).length;
	}

	private open(v: number, ink: number): void {
		if (this.own[v] < 0) this.own[v] = ink;
		else if (this.keptFrom(v, ink)) this.more.set(v, [...(this.more.get(v) ?? []), ink]);
	}
}

/** The reserved inks of a problem by vertex; null when it reserves none. */
export function reservedInks(
	{ reserved, locks }: ColouringProblem,
	vertices: number,
	vertexOf: ArrayLike<number>,
): ReservedInks | null {
	if (!reserved || reserved.length === 0) return null;
	return new ReservedInks(reserved, vertices, locks, vertexOf);
}

/** What is asked of reserved inks region by region. */
export interface ReservedByRegion {
	/** each once, ascending */
	inks: readonly number[];
	/** whether neither the region nor one kept alike with it is locked to this reserved ink */
	keptFrom(region: number, ink: number): boolean;
}

/** The reserved inks of a problem by region; null when it reserves none. */
export function reservedByRegion(problem: ColouringProblem): ReservedByRegion | null {
	const { regions, reserved, locks, alike } = problem;
	if (!reserved || reserved.length === 0) return null;
	const groups = alikeGroups(regions, alike) ?? Uint32Array.from({ length: regions }, (_, r) => r);
	const byGroup = new ReservedInks(reserved, regions, locks, groups);
	const keptFrom = (region: number, ink: number) => byGroup.keptFrom(groups[region], ink);
	return { inks: byGroup.inks, keptFrom };
}
