import type { Join, Regions } from '../join/join.ts';
import type { RawTable } from '../table.ts';
import { essence, significant } from './essence.ts';

/**
 * What is wrong with a join, in plain sentences; empty when every claim holds: each match is what it says it
 * is and could mean no other region, no row is lost, no region is doubled or missing without being listed.
 * Which decisions a person made is not known here. Shares no code with `joinTable`. Linear.
 */
export function checkJoin(table: RawTable, join: Join, regions: Regions): string[] {
	const shape = shapeFaults(table, join, regions);
	if (shape.length) return shape;
	return [
		...matchFaults(table, join, regions),
		...rowFaults(table, join),
		...listFaults(join),
		...countFaults(join),
	];
}

function shapeFaults(table: RawTable, join: Join, regions: Regions): string[] {
	const faults: string[] = [];
	if (join.regions !== regions.keys.length)
		faults.push('The join is of another number of regions.');
	if (join.region.length !== table.rows) faults.push('The join is of another number of rows.');
	if (join.how.length !== table.rows) faults.push('Ways of matching are not one a row.');
	const outside = join.region.findIndex((r) => r < -1 || r >= regions.keys.length);
	if (outside >= 0) faults.push(`Row ${outside} has a region that does not exist.`);
	return faults;
}

/** How many regions share a text, under three ways of looking at it. */
function tallies(labels: string[]) {
	const count = (view: (label: string) => string | null) => {
		const tally = new Map<string, number>();
		for (const label of labels) {
			const seen = view(label);
			if (seen !== null) tally.set(seen, (tally.get(seen) ?? 0) + 1);
		}
		return tally;
	};
	return {
		exact: count((label) => label),
		folded: count(essence),
		zeros: count((label) => significant(essence(label))),
	};
}

function* matchFaults(table: RawTable, join: Join, regions: Regions): Generator<string> {
	const labels = join.choice.by === 'key' ? regions.keys : regions.names;
	const sharing = tallies(labels);
	const views = {
		exact: (text: string) => text,
		folded: essence,
		zeros: (text: string) => significant(essence(text)),
	};
	for (let row = 0; row < table.rows; row++) {
		const cell = table.cells[join.choice.column][row];
		const text = cell === null ? '' : `${cell}`;
		const how = join.how[row];
		if ((how === null) !== join.region[row] < 0) yield `Row ${row} has a region without a reason.`;
		if (how === null) {
			continue;
		}
		if (how === 'by-hand') continue;
		const seen = views[how](text);
		if (seen === null || seen !== views[how](labels[join.region[row]])) {
			yield `Row ${row} ("${text}") does not match #${join.region[row]} as it says (${how}).`;
		} else if (sharing[how].get(seen) !== 1) {
			yield `Row ${row} ("${text}") could mean several regions.`;
		}
	}
	for (const { row, text } of join.unmatched) {
		if (sharing.exact.get(text) === 1)
			yield `Row ${row} ("${text}") names a region but was not matched.`;
	}
}

/** Every row is matched, open or left out, and only one of them. */
function* rowFaults(table: RawTable, join: Join): Generator<string> {
	const places = new Uint8Array(table.rows);
	join.region.forEach((region, row) => {
		if (region >= 0) places[row]++;
	});
	for (const { row } of join.unmatched) places[row]++;
	for (const row of join.leftOut) places[row]++;
	const astray = places.findIndex((count) => count !== 1);
	if (astray >= 0) yield `Row ${astray} is accounted for ${places[astray]} times instead of once.`;
}

function* listFaults(join: Join): Generator<string> {
	const rowsOf = Array.from({ length: join.regions }, (): number[] => []);
	for (let row = 0; row < join.region.length; row++) {
		if (join.region[row] >= 0) rowsOf[join.region[row]].push(row);
	}
	const told = new Map(join.doubled.map(({ region, rows }) => [region, rows.join()]));
	const missing = new Set(join.missing);
	for (let region = 0; region < join.regions; region++) {
		const rows = rowsOf[region];
		if ((rows.length > 1 ? rows.join() : undefined) !== told.get(region)) {
			yield `#${region} stands in ${rows.length} rows, which is not what the list of doubled ones says.`;
		}
		if ((rows.length === 0) !== missing.has(region)) {
			yield `#${region} is wrongly listed as missing or wrongly not.`;
		}
	}
}

function* countFaults(join: Join): Generator<string> {
	for (const [how, count] of Object.entries(join.counts)) {
		const there = join.how.filter((match) => match === how).length;
		if (there !== count) yield `${count} rows are said to match (${how}), but ${there} do.`;
	}
}
