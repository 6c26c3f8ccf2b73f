import type { DrawnText } from '../drawing.ts';
import type { Box } from '../plane/fit.ts';
import { textWidth } from '../type/text-width.ts';
import { shortened } from '../type/wrap-text.ts';
import { emptyRoom } from './empty-room.ts';
import { occupy, type Ground } from './ground.ts';

/** Type of the list on A4: 6 point; never under 5. */
const listSize = 212;
const leastSize = 176;
/** Parts of the type size: from line to line, clear of what is around, between columns. */
const leading = 1.35;
const clear = 1.2;
const between = 1.4;
/** Widest name before it is cut, in parts of the type size. */
const widestName = 18;
/** Rooms that the list may be spread over. */
const mostRooms = 3;
const heading = 'Names by number';

/** Where the list of numbered names goes, and how many lines it has room for. */
export interface ListRoom {
	size: number;
	/** of a column, without what is between two */
	width: number;
	/** of the numbers */
	figures: number;
	/** `head` is 1 where a row is kept for the heading */
	rooms: { x: number; y: number; columns: number; rows: number; head: number }[];
	lines: number;
}

/**
 * Finds room for a list of names on empty paper, in up to three places, and takes it up. In: the names
 * that might be listed. Out: room for as many of them as fit; none is taken where not a line fits.
 */
export function listRoom(ground: Ground, names: string[], scale: number): ListRoom {
	const size = Math.max(leastSize, Math.round(listSize * scale));
	const figures = Math.ceil(textWidth('sans-bold', size, String(names.length)));
	const widest = Math.max(0, ...names.map((name) => textWidth('sans', size, name)));
	const width = Math.ceil(
		Math.max(
			figures + size * 0.5 + Math.min(widest, size * widestName),
			textWidth('sans-bold', size, heading),
		),
	);
	const room: ListRoom = { size, width, figures, rooms: [], lines: 0 };
	const pad = size * clear;
	while (room.rooms.length < mostRooms && room.lines < names.length) {
		const head = room.rooms.length ? 0 : 1;
		const left = names.length - room.lines;
		const shape = (wide: number, high: number) => ({
			columns: Math.floor((wide - 2 * pad + size * between) / (width + size * between)),
			rows: Math.floor((high - 2 * pad) / (size * leading)) - head,
		});
		// no more is worth anything than is needed, and of what suffices the smallest is best
		const worth = (wide: number, high: number) => {
			const { columns, rows } = shape(wide, high);
			if (columns < 1 || rows < 1) return 0;
			const held = Math.min(columns * rows, left);
			return held + (held === left ? 1 / (1 + wide * high * 1e-6) : 0);
		};
		const box = emptyRoom(ground, worth);
		if (!box) break;
		const most = shape(box.width, box.height);
		const columns = Math.min(most.columns, Math.ceil(left / most.rows));
		const rows = Math.min(most.rows, Math.ceil(left / columns));
		const placed = { x: Math.round(box.x + pad), y: Math.round(box.y + pad), columns, rows, head };
		room.rooms.push(placed);
		room.lines += columns * rows;
		occupy(ground, roomBox(room, placed));
	}
	return room;
}

const acrossAll = ({ size, width }: ListRoom, columns: number) =>
	columns * (width + size * between) - size * between;

function roomBox(room: ListRoom, { x, y, columns, rows, head }: ListRoom['rooms'][number]): Box {
	const height = (rows + head) * room.size * leading;
	return { x, y, width: acrossAll(room, columns), height };
}

/** The list, its names in the order of their numbers from 1; no more than there is room for. */
export function drawList(room: ListRoom, names: string[]): DrawnText[] {
	const { size, width, figures } = room;
	const places = room.rooms.flatMap(({ x, y, columns, rows, head }) =>
		Array.from({ length: columns * rows }, (_, i) => ({
			x: Math.round(x + Math.floor(i / rows) * (width + size * between)),
			y: Math.round(y + size * (leading * ((i % rows) + head) + 0.9)),
		})),
	);
	if (!names.length || !places.length) return [];
	const set = (face: 'sans' | 'sans-bold', text: string, x: number, y: number): DrawnText => {
		const wide = Math.ceil(textWidth(face, size, text));
		return { layer: 'collar', text, x, y, size, width: wide, face, hex: '#000000' };
	};
	const [first] = room.rooms;
	const title = shortened('sans-bold', size, heading, acrossAll(room, first.columns));
	return [
		...(title ? [set('sans-bold', title, first.x, Math.round(first.y + size * 0.8))] : []),
		...names.slice(0, places.length).flatMap((name, i) => {
			const { x, y } = places[i];
			const number = set('sans-bold', String(i + 1), x, y);
			const start = Math.round(x + figures + size * 0.5);
			const text = shortened('sans', size, name, x + width - start);
			return [{ ...number, x: x + figures - number.width }, set('sans', text, start, y)];
		}),
	];
}
