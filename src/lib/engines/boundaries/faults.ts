import type { Coverage } from './coverage.ts';

/**
 * What is wrong with a coverage, in plain sentences; empty when every invariant of the type holds.
 * Shares no code with the makers of coverages. Time: linear in the number of points.
 */
export function coverageFaults(coverage: Coverage): string[] {
	const faults = [...lengthFaults(coverage)];
	if (faults.length) return faults;
	return [...arcFaults(coverage), ...ringFaults(coverage), ...sideFaults(coverage)];
}

function* lengthFaults(c: Coverage): Generator<string> {
	const regions = c.keys.length;
	const arcs = c.arcLeft.length;
	if (new Set(c.keys).size !== regions) yield 'A key stands twice.';
	if (c.names.length !== regions) yield 'There are not as many names as keys.';
	if (c.areasKm2.length !== regions || c.enclaveOf.length !== regions) {
		yield 'Areas or enclaves are not one a region.';
	}
	if (c.arcRight.length !== arcs || c.arcMetres.length !== arcs)
		yield 'Arc columns differ in length.';
	yield* startsFaults('arcStarts', c.arcStarts, arcs, c.arcPoints.length / 2);
	yield* startsFaults('ringStarts', c.ringStarts, c.ringStarts.length - 1, c.ringArcs.length);
	yield* startsFaults('partRings', c.partRings, c.partRings.length - 1, c.ringStarts.length - 1);
	yield* startsFaults('regionParts', c.regionParts, regions, c.partRings.length - 1);
}

function* startsFaults(name: string, starts: Uint32Array, count: number, total: number) {
	if (starts.length !== count + 1 || starts[0] !== 0 || starts[count] !== total) {
		yield `${name} does not span its list.`;
		return;
	}
	for (let i = 0; i < count; i++) {
		if (starts[i] > starts[i + 1]) {
			yield `${name} goes back at ${i}.`;
			return;
		}
	}
}

function* arcFaults(c: Coverage): Generator<string> {
	const regions = c.keys.length;
	for (const value of c.arcPoints) {
		if (!Number.isFinite(value)) {
			yield 'A position is not a number.';
			break;
		}
	}
	for (let a = 0; a < c.arcLeft.length; a++) {
		const first = c.arcStarts[a];
		const last = c.arcStarts[a + 1] - 1;
		if (last <= first) yield `Arc ${a} has fewer than two points.`;
		else if (samePoint(c, first, last) && last - first < 3) {
			yield `Closed arc ${a} has fewer than four points.`;
		}
		const left = c.arcLeft[a];
		const right = c.arcRight[a];
		if (left < -1 || right < -1 || left >= regions || right >= regions || left === right) {
			yield `Arc ${a} lies between ${left} and ${right}.`;
		}
		if (!(c.arcMetres[a] >= 0)) yield `Arc ${a} has no length.`;
	}
}

const samePoint = (c: Coverage, i: number, j: number) =>
	c.arcPoints[2 * i] === c.arcPoints[2 * j] && c.arcPoints[2 * i + 1] === c.arcPoints[2 * j + 1];

function* ringFaults(c: Coverage): Generator<string> {
	for (let part = 0; part + 1 < c.partRings.length; part++) {
		if (c.partRings[part] === c.partRings[part + 1]) yield `Part ${part} has no ring.`;
		for (let ring = c.partRings[part]; ring < c.partRings[part + 1]; ring++) {
			const first = c.ringStarts[ring];
			const end = c.ringStarts[ring + 1];
			if (first === end) {
				yield `Ring ${ring} has no arc.`;
				continue;
			}
			for (let i = first; i < end; i++) {
				const next = i + 1 === end ? first : i + 1;
				if (!samePoint(c, halfEnd(c, c.ringArcs[i]), halfEnd(c, ~c.ringArcs[next]))) {
					yield `Ring ${ring} breaks after its arc ${i - first}.`;
				}
			}
			const outer = ring === c.partRings[part];
			if (turning(c, ring) > 0 !== outer) yield `Ring ${ring} is walked the wrong way round.`;
		}
	}
}

/** Index of the point where a half-arc ends. */
function halfEnd(c: Coverage, half: number): number {
	return half >= 0 ? c.arcStarts[half + 1] - 1 : c.arcStarts[~half];
}

/** Signed area in squared degrees, summed arc by arc about the ring's first point. */
function turning(c: Coverage, ring: number): number {
	let sum = 0;
	const origin = halfEnd(c, ~c.ringArcs[c.ringStarts[ring]]);
	const ox = c.arcPoints[2 * origin];
	const oy = c.arcPoints[2 * origin + 1];
	for (let i = c.ringStarts[ring]; i < c.ringStarts[ring + 1]; i++) {
		const half = c.ringArcs[i];
		const arc = half >= 0 ? half : ~half;
		let swept = 0;
		for (let p = c.arcStarts[arc]; p + 1 < c.arcStarts[arc + 1]; p++) {
			const x = c.arcPoints[2 * p] - ox;
			const y = c.arcPoints[2 * p + 1] - oy;
			swept += x * (c.arcPoints[2 * p + 3] - oy) - (c.arcPoints[2 * p + 2] - ox) * y;
		}
		sum += half >= 0 ? swept : -swept;
	}
	return sum;
}

/** Every side of every arc that has a region is walked exactly once, by a ring of that region. */
function* sideFaults(c: Coverage): Generator<string> {
	const arcs = c.arcLeft.length;
	const walked = new Uint8Array(2 * arcs);
	for (let region = 0; region < c.keys.length; region++) {
		const firstRing = c.partRings[c.regionParts[region]];
		const endRing = c.partRings[c.regionParts[region + 1]];
		for (let i = c.ringStarts[firstRing]; i < c.ringStarts[endRing]; i++) {
			const half = c.ringArcs[i];
			const arc = half >= 0 ? half : ~half;
			if (arc >= arcs) {
				yield `Region ${region} walks arc ${arc}, which does not exist.`;
				continue;
			}
			const owner = half >= 0 ? c.arcLeft[arc] : c.arcRight[arc];
			if (owner !== region) yield `Region ${region} walks arc ${arc}, which belongs to ${owner}.`;
			if (walked[2 * arc + (half >= 0 ? 0 : 1)]++) yield `Arc ${arc} is walked twice on one side.`;
		}
	}
	for (let arc = 0; arc < arcs; arc++) {
		if (c.arcLeft[arc] >= 0 !== walked[2 * arc] > 0) yield `The left of arc ${arc} is in no ring.`;
		if (c.arcRight[arc] >= 0 !== walked[2 * arc + 1] > 0)
			yield `The right of arc ${arc} is in no ring.`;
	}
}
