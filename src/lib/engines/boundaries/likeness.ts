/**
 * A short name for how a file is built: the same for two files of one format with the same layers and
 * columns, whatever they hold. 53 bits as hexadecimal digits, so that it tells nothing of the names.
 * Method: two multiply-and-mix streams over the code units (cyrb53, public domain).
 */
export function likenessOf(format: string, layers: string[], columns: string[]): string {
	const text = [format, layers.length, ...layers, ...columns].join('\u001f');
	let a = 0xdeadbeef;
	let b = 0x41c6ce57;
	for (let i = 0; i < text.length; i++) {
		const unit = text.charCodeAt(i);
		a = Math.imul(a ^ unit, 2654435761);
		b = Math.imul(b ^ unit, 1597334677);
	}
	a = Math.imul(a ^ (a >>> 16), 2246822507) ^ Math.imul(b ^ (b >>> 13), 3266489909);
	b = Math.imul(b ^ (b >>> 16), 2246822507) ^ Math.imul(a ^ (a >>> 13), 3266489909);
	const high = (b >>> 0) & 0x1fffff;
	return high.toString(16).padStart(6, '0') + (a >>> 0).toString(16).padStart(8, '0');
}
