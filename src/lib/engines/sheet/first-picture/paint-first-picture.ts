import { channelsOf } from '../../colour/index.ts';
import { firstRanks, type FirstLine, type FirstPicture } from './first-picture.ts';

/**
 * What a line along the sides of cells is too long by, in the mean over all directions: 4 to pi (Crofton's
 * formula for the length of a curve by its crossings with a grid).
 */
const straighter = Math.PI / 4;

/**
 * The picture in colours. In: a colour for every region, as the reader sees it. Out: a pixel a cell, red,
 * green, blue and alpha in turn, white where there is no region; each line lightly over both sides of its
 * border, as much of a cell as it covers, by ranks.
 */
export function paintFirstPicture(
	picture: FirstPicture,
	hexOf: (region: number) => string,
): Uint8ClampedArray<ArrayBuffer> {
	const pixels = new Uint8ClampedArray(4 * picture.owner.length);
	const whole = new Uint32Array(pixels.buffer);
	const packed = Uint32Array.from(picture.group, (_, region) => packedOf(hexOf(region)));
	const paper = packedOf('#ffffff');
	picture.owner.forEach((region, i) => (whole[i] = region < 0 ? paper : packed[region]));
	for (const line of picture.lines) layLine(pixels, picture, line);
	return pixels;
}

const bytesOf = (hex: string): number[] =>
	channelsOf(hex).map((channel) => Math.round(255 * channel));

/** A colour in the order of bytes of a pixel, little-endian. */
function packedOf(hex: string): number {
	const [red, green, blue] = bytesOf(hex);
	return ((255 << 24) | (blue << 16) | (green << 8) | red) >>> 0;
}

function layLine(pixels: Uint8ClampedArray, picture: FirstPicture, line: FirstLine): void {
	const cover = coverage(picture, line);
	const channels = bytesOf(line.hex);
	for (let i = 0; i < cover.length; i++) {
		const share = cover[i] / 255;
		if (share === 0) continue;
		for (let c = 0; c < 3; c++)
			pixels[4 * i + c] += Math.round((channels[c] - pixels[4 * i + c]) * share);
	}
}

/** How much of each cell a line covers, to 255. */
function coverage(picture: FirstPicture, { rank, width }: FirstLine): Uint8ClampedArray {
	const { owner, columns, rows, cell } = picture;
	const cover = new Uint8ClampedArray(owner.length);
	const half = (straighter * width) / (2 * cell);
	const reach = Array.from(
		{ length: Math.ceil(half) },
		(_, away) => 255 * Math.min(1, half - away),
	);
	const drawn = drawnBetween(picture, rank);
	const lay = (at: number, step: number, room: number) => {
		for (let away = 0; away < reach.length && away <= room; away++)
			cover[at + away * step] += reach[away];
	};
	for (let row = 0, i = 0; row < rows; row++) {
		for (let column = 0; column < columns; column++, i++) {
			if (column + 1 < columns && owner[i] !== owner[i + 1] && drawn(owner[i], owner[i + 1])) {
				lay(i, -1, column);
				lay(i + 1, 1, columns - column - 2);
			}
			const under = i + columns;
			if (row + 1 < rows && owner[i] !== owner[under] && drawn(owner[i], owner[under])) {
				lay(i, -columns, row);
				lay(under, columns, rows - row - 2);
			}
		}
	}
	return cover;
}

/** Whether the line between two owners that differ is of a rank. */
function drawnBetween(
	{ group }: FirstPicture,
	rank: FirstLine['rank'],
): (a: number, b: number) => boolean {
	if (rank === firstRanks[2]) return (a, b) => a < 0 || b < 0;
	const grouped = rank === firstRanks[1];
	return (a, b) => a >= 0 && b >= 0 && (group[a] !== group[b]) === grouped;
}
