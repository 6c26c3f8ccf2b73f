import type { Aim } from './improve-aim.ts';
import type { Ground } from './improve-ground.ts';

/** Fewest changes: regions whose ink differs from the one they had; regions that had none do not count. */
export class ChangesAim implements Aim {
	readonly kind = 'fewest-changes';
	readonly scales = 1;
	readonly descends = false;
	value = 0;
	bound = 0;
	private weighed = 0;
	/** the earlier ink by place, -1 for none */
	private readonly old: Int32Array;

	constructor(private readonly ground: Ground) {
		const { regionAt, problem } = ground;
		this.old = Int32Array.from(regionAt, (region) => problem.previous?.[region] ?? -1);
		this.read();
	}

	get enough(): number {
		return this.bound;
	}

	read(): void {
		const { vertexAt, board } = this.ground;
		this.value = 0;
		for (let p = 0; p < this.old.length; p++) {
			if (this.old[p] >= 0 && this.old[p] !== board.ink[vertexAt[p]]) this.value++;
		}
	}

	after(chain: Uint32Array, c: number, d: number): number {
		const { first, board } = this.ground;
		let value = this.value;
		for (const v of chain) {
			const now = board.ink[v];
			const then = now === c ? d : c;
			for (let p = first[v]; p < first[v + 1]; p++) {
				if (this.old[p] === now) value++;
				else if (this.old[p] === then) value--;
			}
		}
		return (this.weighed = value);
	}

	keep(): void {
		this.value = this.weighed;
	}

	forget(): void {}

	/** Vertices that later goals may use: they have changed, or had no ink. */
	loose(): number[] {
		const { first, board } = this.ground;
		const found: number[] = [];
		for (let v = 0; v < board.graph.count; v++) {
			let loose = false;
			for (let p = first[v]; p < first[v + 1]; p++) loose ||= this.old[p] !== board.ink[v];
			if (loose) found.push(v);
		}
		return found;
	}
}
