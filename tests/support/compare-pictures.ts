import type { PNG } from 'pngjs';

/**
 * Share of pixels in which two pictures of one size differ by more than `slack` of 255 in some channel,
 * transparent ones taken as lying on white; and by how much the whole differs in the mean, of 255.
 */
export function difference(a: PNG, b: PNG, slack: number): { share: number; mean: number } {
	if (a.width !== b.width || a.height !== b.height) {
		throw new Error(`${a.width} x ${a.height} is not ${b.width} x ${b.height}`);
	}
	let [far, sum] = [0, 0];
	for (let at = 0; at < a.data.length; at += 4) {
		let most = 0;
		for (let channel = 0; channel < 3; channel++) {
			const apart = Math.abs(onWhite(a, at, channel) - onWhite(b, at, channel));
			sum += apart;
			most = Math.max(most, apart);
		}
		if (most > slack) far++;
	}
	const pixels = a.width * a.height;
	return { share: far / pixels, mean: sum / (3 * pixels) };
}

function onWhite({ data }: PNG, at: number, channel: number): number {
	const alpha = data[at + 3] / 255;
	return data[at + channel] * alpha + 255 * (1 - alpha);
}
