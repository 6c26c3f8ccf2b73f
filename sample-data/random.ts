/** A stream of numbers from 0 up to, not including, 1; the same for the same seed (mulberry32, public domain). */
export function randomStream(seed: number): () => number {
	let state = seed >>> 0;
	return () => {
		state = (state + 0x6d2b79f5) >>> 0;
		let mixed = Math.imul(state ^ (state >>> 15), state | 1);
		mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
		return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
	};
}

/** A number from 0 to 1 for a pair of whole numbers: the same pair gives the same number anywhere. */
export function hashed(x: number, y: number, seed: number): number {
	let mixed = Math.imul(x, 0x27d4eb2d) ^ Math.imul(y, 0x165667b1) ^ Math.imul(seed, 0x9e3779b1);
	mixed = Math.imul(mixed ^ (mixed >>> 15), 0x85ebca6b);
	mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
	return ((mixed ^ (mixed >>> 16)) >>> 0) / 4294967296;
}

/**
 * Smooth noise of five octaves, about -1 to 1, with features of the given size; each octave counts for
 * `calm` times less than the one before.
 */
export function noise(x: number, y: number, size: number, seed: number, calm = 1.9): number {
	let [sum, weight, scale] = [0, 0.5, 1 / size];
	for (let octave = 0; octave < 5; octave++) {
		sum += weight * (2 * valueNoise(x * scale, y * scale, seed + octave) - 1);
		weight /= calm;
		scale *= 2.03;
	}
	return sum;
}

function valueNoise(x: number, y: number, seed: number): number {
	const [ix, iy] = [Math.floor(x), Math.floor(y)];
	const [fx, fy] = [ease(x - ix), ease(y - iy)];
	const low = mix(hashed(ix, iy, seed), hashed(ix + 1, iy, seed), fx);
	const high = mix(hashed(ix, iy + 1, seed), hashed(ix + 1, iy + 1, seed), fx);
	return mix(low, high, fy);
}

function ease(t: number): number {
	return t * t * (3 - 2 * t);
}

function mix(a: number, b: number, t: number): number {
	return a + (b - a) * t;
}

export function shuffled<T>(items: readonly T[], random: () => number): T[] {
	const out = [...items];
	for (let last = out.length - 1; last > 0; last--) {
		const pick = Math.floor(random() * (last + 1));
		[out[last], out[pick]] = [out[pick], out[last]];
	}
	return out;
}
