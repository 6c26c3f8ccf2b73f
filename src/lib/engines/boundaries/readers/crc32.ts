const table = Uint32Array.from({ length: 256 }, (_, n) => {
	let c = n;
	for (let k = 0; k < 8; k++) c = c & 1 ? (c >>> 1) ^ 0xedb88320 : c >>> 1;
	return c;
});

/** The checksum of ISO 3309 that archives carry for each file; goes on from that of the bytes before. */
export function crc32(bytes: Uint8Array, before = 0): number {
	let c = before ^ 0xffffffff;
	for (let i = 0; i < bytes.length; i++) c = table[(c ^ bytes[i]) & 255] ^ (c >>> 8);
	return (c ^ 0xffffffff) >>> 0;
}
