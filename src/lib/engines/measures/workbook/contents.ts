import { TableRefusal } from '../refusal.ts';
import { damaged } from './damaged.ts';
import type { WorkbookPackage } from './package.ts';
import { attribute, parsePart } from './xml.ts';

/** Where the parts of a workbook are, and what it says about all of them. */
export interface Contents {
	sheets: { name: string; part: string }[];
	sharedStrings: string | null;
	styles: string | null;
	/** days count from 1904 instead of 1900 */
	from1904: boolean;
}

interface Relation {
	/** last word of its type, which is the same in the transitional and the strict kind of workbook */
	type: string;
	part: string;
}

/** Reads the relations and the list of sheets (ECMA-376 part 1, 12.3.23, 18.2.19 and 18.2.20). */
export function readContents(pack: WorkbookPackage): Contents {
	refuseOthers(pack);
	const roots = [...relations(pack, '').values()];
	const workbook = roots.find(({ type }) => type === 'officeDocument')?.part ?? 'xl/workbook.xml';
	if (!pack.has(workbook)) throw notAWorkbook();
	const related = relations(pack, workbook);
	const partOf = (wanted: string) => {
		const found = [...related.values()].find(({ type }) => type === wanted);
		return found && pack.has(found.part) ? found.part : null;
	};
	const { listed, from1904 } = sheetList(pack, workbook);
	const sheets = listed.flatMap(({ name, id }) => {
		const relation = related.get(id);
		if (!relation) throw damaged(`the sheet "${name}" has no part`);
		// charts and dialogs are listed as sheets too
		return relation.type === 'worksheet' ? [{ name, part: relation.part }] : [];
	});
	if (!sheets.length) throw new TableRefusal('no-rows', 'The workbook has no sheet with cells.');
	return { sheets, sharedStrings: partOf('sharedStrings'), styles: partOf('styles'), from1904 };
}

function refuseOthers(pack: WorkbookPackage): void {
	if (pack.has('xl/workbook.bin')) {
		const message = 'This is a workbook of the binary kind (.xlsb). Save it as .xlsx.';
		throw new TableRefusal('binary-workbook', message);
	}
	if (pack.has('META-INF/manifest.xml') && pack.has('content.xml')) {
		const message = 'This is an OpenDocument file. Save the table as .xlsx or as CSV.';
		throw new TableRefusal('open-document', message);
	}
	if (!pack.has('[Content_Types].xml') && !pack.has('xl/workbook.xml')) throw notAWorkbook();
}

const notAWorkbook = () =>
	new TableRefusal(
		'not-a-workbook',
		'This is an archive but no workbook. Unpack it and take the table.',
	);

function relations(pack: WorkbookPackage, owner: string): Map<string, Relation> {
	const cut = owner.lastIndexOf('/') + 1;
	const [folder, file] = [owner.slice(0, cut), owner.slice(cut)];
	const found = new Map<string, Relation>();
	const part = `${folder}_rels/${file}.rels`;
	if (!pack.has(part)) return found;
	parsePart(pack, part, {
		open(name, { Id = '', Type = '', Target = '', TargetMode }) {
			if (name !== 'Relationship' || TargetMode === 'External') return;
			const type = Type.slice(Type.lastIndexOf('/') + 1);
			found.set(Id, { type, part: resolve(folder, Target) });
		},
	});
	return found;
}

/** A target is meant from its owner's folder, or from the top where it begins with a slash. */
function resolve(folder: string, target: string): string {
	const path: string[] = [];
	for (const step of (target.startsWith('/') ? target : folder + target).split('/')) {
		if (step === '..') path.pop();
		else if (step && step !== '.') path.push(step);
	}
	return path.join('/');
}

function sheetList(pack: WorkbookPackage, workbook: string) {
	const listed: { name: string; id: string }[] = [];
	let from1904 = false;
	parsePart(pack, workbook, {
		open(name, attributes) {
			if (name === 'sheet') {
				listed.push({ name: attributes.name ?? '', id: attribute(attributes, 'id') ?? '' });
			}
			if (name === 'workbookPr') from1904 = /^(1|true)$/.test(attributes.date1904 ?? '');
		},
	});
	return { listed, from1904 };
}
