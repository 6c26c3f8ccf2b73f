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
	rooms: { x: number; y: number; columns: number; rows: number }[];
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
	const width = Math.ceil(figures + size * 0.5 + Math.min(widest, size * widestName));
	const room: ListRoom = { size, width, figures, rooms: [], lines: 0 };
	const pad = size * clear;
	const shape = (wide: number, high: number) => ({
		columns: Math.floor((wide - 2 * pad + size * between) / (width + size * between)),
		rows: Math.floor((high - 2 * pad) / (size * leading)),
	});
	while (room.rooms.length < mostRooms && room.lines < names.length) {
		const extra = room.rooms.length ? 0 : 1;
		const left = names.length - room.lines + extra;
		// no more is worth anything than is needed, and of what suffices the smallest is best
		const worth = (wide: number, high: number) => {
			const { columns, rows } = shape(wide, high);
			if (columns < 1 || rows < 2 + extra) return 0;
			const held = Math.min(columns * rows, left);
			return held + (held === left ? 1 / (1 + wide * high * 1e-6) : 0);
		};
		const box = emptyRoom(ground, worth);
		if (!box) break;
		const { columns, rows } = shape(box.width, box.height);
		const used = Math.min(columns, Math.ceil(left / rows));
		const needed = Math.min(rows, Math.ceil(left / used));
		const placed = { x: Math.round(box.x + pad), y: Math.round(box.y + pad), columns: used, rows: needed };
		room.rooms.push(placed);
		room.lines += used * needed - extra;
		occupy(ground, roomBox(room, placed));
	}
	room.lines = Math.max(0, room.lines);
	return room;
}

function roomBox({ size, width }: ListRoom, { x, y, columns, rows }: ListRoom['rooms'][number]): Box {
	const across = columns * (width + size * between) - size * between;
	return { x, y, width: across, height: rows * size * leading };
}

/** The list, its names in the order of their numbers from 1; no more than there is room for. */
export function drawList(room: ListRoom, names: string[]): DrawnText[] {
	const { size, width, figures } = room;
	const places = room.rooms.flatMap(({ x, y, columns, rows }) =>
		Array.from({ length: columns * rows }, (_, i) => ({
			x: Math.round(x + Math.floor(i / rows) * (width + size * between)),
			y: Math.round(y + size * (leading * (i % rows) + 0.9)),
		})),
	);
	if (!names.length || !places.length) return [];
	const set = (face: 'sans' | 'sans-bold', text: string, x: number, y: number): DrawnText => {
		const wide = Math.ceil(textWidth(face, size, text));
		return { layer: 'collar', text, x, y, size, width: wide, face, hex: '#000000' };
	};
	const title = shortened('sans-bold', size, heading, width);
	return [
		...(title ? [set('sans-bold', title, places[0].x, places[0].y)] : []),
		...names.slice(0, room.lines).flatMap((name, i) => {
			const { x, y } = places[i + 1];
			const number = set('sans-bold', String(i + 1), x, y);
			const start = Math.round(x + figures + size * 0.5);
			const text = shortened('sans', size, name, x + width - start);
			return [{ ...number, x: x + figures - number.width }, set('sans', text, start, y)];
		}),
	];
}
