/**
 * Memory of large arrays that are done with, given out again: the first touch of new memory takes the
 * system longer than most of what is then done with it, and the peak falls by as much.
 */
export class Room {
	private free: Uint8Array[] = [];

	/** Puts the memory of an array at the disposal of others; nobody may use the array any more. */
	give(array: ArrayBufferView): void {
		const { buffer, byteOffset, byteLength } = array;
		const skipped = -byteOffset & 3;
		if (byteLength < leastBytes) return;
		this.free.push(
			new Uint8Array(buffer as ArrayBuffer, byteOffset + skipped, byteLength - skipped),
		);
	}

	/** An array of so many integers with anything in it, or zeros where new memory had to be asked for. */
	ints(length: number): Int32Array {
		const bytes = 4 * length;
		const place = this.free.findIndex((piece) => piece.length >= bytes);
		if (place < 0 || bytes < leastBytes) return new Int32Array(length);
		const [piece] = this.free.splice(place, 1);
		this.give(piece.subarray(bytes));
		return new Int32Array(piece.buffer, piece.byteOffset, length);
	}

	/** So many zeros, a byte each. */
	zeroBytes(length: number): Uint8Array {
		const { buffer, byteOffset } = this.zeros(Math.ceil(length / 4));
		return new Uint8Array(buffer, byteOffset, length);
	}

	/** As many zeros. */
	zeros(length: number): Int32Array {
		return this.ints(length).fill(0);
	}
}

/** Smaller pieces are not worth keeping. */
const leastBytes = 1 << 16;
