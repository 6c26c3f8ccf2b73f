import type { BorderList } from './border-list.ts';

/** Pairs being collected: metres add up, the place kept is that of the longest stretch. */
export class PairTally {
	private places = new Map<number, number>();
	private kinds: number[] = [];
	private metres: number[] = [];
	private longest: number[] = [];
	private at: number[] = [];

	constructor(private regions: number) {}

	has(a: number, b: number): boolean {
		return this.places.has(this.code(a, b));
	}

	add(a: number, b: number, kind: number, metres: number, x: number, y: number): void {
		const code = this.code(a, b);
		const i = this.places.get(code);
		if (i === undefined) {
			this.places.set(code, this.kinds.length);
			this.kinds.push(kind);
			this.metres.push(metres);
			this.longest.push(metres);
			this.at.push(x, y);
			return;
		}
		this.metres[i] += metres;
		if (metres <= this.longest[i]) return;
		this.longest[i] = metres;
		this.at[2 * i] = x;
		this.at[2 * i + 1] = y;
	}

	list(): BorderList {
		const entries = [...this.places].sort((p, q) => p[0] - q[0]);
		const list = emptyList(entries.length);
		entries.forEach(([code, i], k) => {
			list.a[k] = Math.floor(code / this.regions);
			list.b[k] = code % this.regions;
			list.kind[k] = this.kinds[i];
			list.metres[k] = this.metres[i];
			list.at[2 * k] = this.at[2 * i];
			list.at[2 * k + 1] = this.at[2 * i + 1];
		});
		return list;
	}

	private code(a: number, b: number): number {
		return a < b ? a * this.regions + b : b * this.regions + a;
	}
}

export function emptyList(count: number): BorderList {
	return {
		a: new Uint32Array(count),
		b: new Uint32Array(count),
		kind: new Uint8Array(count),
		metres: new Float64Array(count),
		at: new Float64Array(2 * count),
	};
}
