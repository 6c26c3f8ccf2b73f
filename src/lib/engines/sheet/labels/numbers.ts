import type { DrawnText } from '../drawing.ts';
import { isSetIn } from '../type/text-width.ts';
import { headroom } from './headroom.ts';
import { drawList, listRoom, type ListRoom } from './name-list.ts';
import { keep, numberSpot, type NameTask } from './region-labels.ts';
import type { SetName } from './set-name.ts';
import { textBox } from './text-box.ts';

/** Numbers are set in the face of the list, to be told from names. */
const face = 'sans';

/** As an index is ordered: without accents first, so that it is the same on every machine. */
function byName(a: string, b: string): number {
	const plain = (text: string) => text.normalize('NFD').replace(/\p{M}/gu, '').toUpperCase();
	const [x, y] = [plain(a), plain(b)];
	if (x !== y) return x < y ? -1 : 1;
	return a < b ? -1 : a > b ? 1 : 0;
}

/**
 * Numbers for regions whose names found no room, and the list that says whose they are. Only as many as
 * the list has room for, in the order given; numbered by name. `allOrNone`: where not nearly all can be
 * numbered none is.
 */
export function setNumbers(
	task: NameTask,
	waiting: number[],
	names: string[],
	size: number,
	scale: number,
	allOrNone: boolean,
): { numbered: SetName[]; list: DrawnText[] } {
	const none = { numbered: [], list: [] };
	const told = waiting.filter((region) => names[region] && isSetIn(face, names[region]));
	if (!told.length) return none;
	const { busy } = task.ground;
	const before = busy.slice();
	const room = listRoom(
		task.ground,
		told.map((region) => names[region]),
		scale,
	);
	if (!room.lines || (allOrNone && room.lines < told.length)) return none;
	task.ground.room = headroom(task.ground.raster, task.ground.busy);
	const widest = textBox(['8'.repeat(String(told.length).length)], face, size);
	const rails = { right: [], left: [] };
	const numbered: SetName[] = [];
	for (const region of told) {
		if (numbered.length === room.lines) break;
		const spot = numberSpot(task, region, widest, rails);
		if (!spot) continue;
		const name: SetName = { region, short: false, ...spot, how: 'number' };
		keep(task.ground, name);
		numbered.push(name);
	}
	numbered.sort((a, b) => byName(names[a.region], names[b.region]) || a.region - b.region);
	const listed = numbered.map(({ region }) => names[region]);
	return {
		numbered: numbered.map((name, i) => ({ ...name, box: textBox([String(i + 1)], face, size) })),
		list: drawList(closest(task, before, room, numbered, names, scale), listed),
	};
}

/** Room for just the names that are numbered, or what was kept for them where that turns out less. */
function closest(
	{ ground }: NameTask,
	before: Uint8Array,
	kept: ListRoom,
	numbered: SetName[],
	names: string[],
	scale: number,
): ListRoom {
	ground.busy.set(before);
	for (const name of numbered) keep(ground, name);
	const room = listRoom(
		ground,
		numbered.map(({ region }) => names[region]),
		scale,
	);
	return room.lines < numbered.length ? kept : room;
}
