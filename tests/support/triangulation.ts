/**
 * A triangulation of half-edges: three to a triangle, `origin[e]` its start, `twin[e]` the same edge
 * from the other side or -1 on the outline.
 */
export class Triangulation {
	constructor(
		readonly origin: Int32Array,
		readonly twin: Int32Array,
		public size: number,
	) {}

	next(e: number): number {
		return e % 3 === 2 ? e - 2 : e + 1;
	}

	previous(e: number): number {
		return e % 3 === 0 ? e + 2 : e - 1;
	}

	link(e: number, f: number): void {
		this.twin[e] = f;
		if (f >= 0) this.twin[f] = e;
	}

	/** The ends of edge e and the two corners opposite it: [p, q, r, s] with r on e's own side. */
	around(e: number): [number, number, number, number] {
		const { origin } = this;
		const q = origin[this.next(e)];
		return [origin[e], q, origin[this.previous(e)], origin[this.previous(this.twin[e])]];
	}

	/** Replaces the edge by the other diagonal of its two triangles. */
	flip(e: number): void {
		const { origin, twin } = this;
		const f = twin[e];
		const [en, ep, fn, fp] = [this.next(e), this.previous(e), this.next(f), this.previous(f)];
		const [p, q, r, s] = this.around(e);
		const [beyondEn, beyondFn] = [twin[en], twin[fn]];
		[origin[e], origin[en], origin[ep]] = [p, s, r];
		[origin[f], origin[fn], origin[fp]] = [q, r, s];
		this.link(e, beyondFn);
		this.link(f, beyondEn);
		this.link(en, fn);
	}

	/** Puts vertex v into the triangle of half-edge e. */
	split(e: number, v: number): void {
		const { origin, twin, size } = this;
		const [en, ep] = [this.next(e), this.previous(e)];
		const [a, b, c] = [origin[e], origin[en], origin[ep]];
		const [beyondN, beyondP] = [twin[en], twin[ep]];
		origin[ep] = v;
		origin.set([b, c, v, c, a, v], size);
		this.link(size, beyondN);
		this.link(size + 3, beyondP);
		this.link(en, size + 2);
		this.link(size + 1, size + 5);
		this.link(ep, size + 4);
		this.size += 6;
	}

	/** Every edge once, as two lists of ends. */
	edges(): { a: Uint32Array; b: Uint32Array } {
		const a: number[] = [];
		const b: number[] = [];
		for (let e = 0; e < this.size; e++) {
			if (this.twin[e] > e) continue;
			a.push(this.origin[e]);
			b.push(this.origin[this.next(e)]);
		}
		return { a: Uint32Array.from(a), b: Uint32Array.from(b) };
	}
}
