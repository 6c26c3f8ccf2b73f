/**
 * A first picture as bytes, little-endian: eleven numbers of four bytes (version, columns, rows, x, y,
 * cell, width and height of the paper in micrometres, regions, owners told, bytes of text); the owners
 * told and the groups, four bytes each; one byte a cell; the lines as JSON. A cell's byte says where its
 * owner is known from, so that the whole packs to a tenth of a byte a cell.
 */
import { firstRanks, type FirstLine, type FirstPicture } from './first-picture.ts';

const version = 1;
const headLength = 11;
/** Where a cell's owner is known from: the cell to the left, above, above to the right, or the list. */
const [left, above, aboveRight, told] = [0, 1, 2, 3];

export function encodeFirstPicture(picture: FirstPicture): Uint8Array {
	const { columns, rows, x, y, cell, widthMm, heightMm, group, lines } = picture;
	const { codes, list } = coded(picture);
	const text = new TextEncoder().encode(JSON.stringify(lines));
	const micrometres = [widthMm, heightMm].map((mm) => Math.round(mm * 1000));
	const head = Int32Array.of(
		...[version, columns, rows, x, y, cell],
		...[...micrometres, group.length, list.length, text.length],
	);
	const numbers = 4 * (headLength + list.length + group.length);
	const bytes = new Uint8Array(numbers + codes.length + text.length);
	const words = new Int32Array(bytes.buffer, 0, numbers / 4);
	words.set(head);
	words.set(list, headLength);
	words.set(group, headLength + list.length);
	bytes.set(codes, numbers);
	bytes.set(text, numbers + codes.length);
	return bytes;
}

function coded({ owner, columns }: FirstPicture): { codes: Uint8Array; list: number[] } {
	const codes = new Uint8Array(owner.length);
	const list: number[] = [];
	for (let i = 0; i < owner.length; i++) {
		const one = owner[i];
		if (one === (i > 0 ? owner[i - 1] : -1)) codes[i] = left;
		else if (i >= columns && one === owner[i - columns]) codes[i] = above;
		else if (i >= columns && columns > 1 && one === owner[i - columns + 1]) codes[i] = aboveRight;
		else {
			codes[i] = told;
			list.push(one);
		}
	}
	return { codes, list };
}

/** What `encodeFirstPicture` made. Throws RangeError for bytes that are cut off or spoilt. */
export function decodeFirstPicture(bytes: ArrayBuffer): FirstPicture {
	if (bytes.byteLength < 4 * headLength) throw new RangeError('The picture is cut off.');
	const [made, columns, rows, x, y, cell, width, height, regions, listed, textBytes] =
		new Int32Array(bytes, 0, headLength);
	if (made !== version) throw new RangeError(`A picture of version ${made} cannot be read.`);
	const counts = [columns, rows, cell, regions, listed, textBytes];
	const numbers = 4 * (headLength + listed + regions);
	const size = numbers + columns * rows + textBytes;
	if (counts.some((count) => count < 0) || cell === 0 || size !== bytes.byteLength)
		throw new RangeError('The picture is cut off.');
	const list = new Int32Array(bytes, 4 * headLength, listed);
	const codes = new Uint8Array(bytes, numbers, columns * rows);
	return {
		...{ widthMm: width / 1000, heightMm: height / 1000, x, y, cell, columns, rows },
		owner: ownersOf(codes, list, columns, regions),
		group: new Uint32Array(bytes, 4 * (headLength + listed), regions),
		lines: linesOf(new TextDecoder().decode(new Uint8Array(bytes, numbers + columns * rows))),
	};
}

function ownersOf(codes: Uint8Array, list: Int32Array, columns: number, regions: number) {
	if (list.some((region) => region < -1 || region >= regions))
		throw new RangeError('The picture names a region that is not there.');
	const owner = new Int32Array(codes.length);
	let next = 0;
	for (let i = 0; i < codes.length; i++) {
		const code = codes[i];
		if (code === left) owner[i] = i > 0 ? owner[i - 1] : -1;
		else if (code === told && next < list.length) owner[i] = list[next++];
		else if (code === above && i >= columns) owner[i] = owner[i - columns];
		else if (code === aboveRight && i >= columns && columns > 1) owner[i] = owner[i - columns + 1];
		else throw new RangeError('The picture is spoilt.');
	}
	return owner;
}

function linesOf(text: string): FirstLine[] {
	const lines: FirstLine[] = JSON.parse(text);
	const good = ({ rank, width, hex }: FirstLine) =>
		firstRanks.includes(rank) && width >= 0 && /^#[0-9a-f]{6}$/i.test(hex);
	if (!Array.isArray(lines) || !lines.every(good)) throw new RangeError('The picture is spoilt.');
	return lines;
}
