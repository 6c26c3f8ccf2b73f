import { expect, it } from 'vitest';
import { Room } from './room.ts';

it('gives memory out again, each byte to one array only', () => {
	const room = new Room();
	const old = new Uint8Array(1_000_003).fill(255).subarray(3);
	room.give(old);
	const arrays = [
		room.ints(50_000),
		room.zeros(100_000),
		room.zeroBytes(100_001),
		room.ints(90_000),
	];
	expect(arrays.map(({ length }) => length)).toEqual([50_000, 100_000, 100_001, 90_000]);
	expect(arrays.slice(0, 3).every(({ buffer }) => buffer === old.buffer)).toBe(true);
	expect(arrays[1].every((value) => value === 0)).toBe(true);
	expect(arrays[2].every((value) => value === 0)).toBe(true);
	arrays.forEach((array, i) => array.fill(i + 1));
	arrays.forEach((array, i) => expect(array.every((value) => value === i + 1)).toBe(true));
});
