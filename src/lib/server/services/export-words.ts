import { exportKind, type ExportKindId } from '../../engines/exports/index.ts';
import type { Reader } from '../../engines/palettes/index.ts';
import { dayInWords } from './day-in-words.ts';
import { fileStem } from './drawing.service.ts';

/** Of what a file is taken: an edition, or a revision of the draft. */
export interface TakenOf {
	sheetName: string;
	/** null: of a draft */
	edition: number | null;
	/** of a draft: the last edition issued before it, 0 for none */
	lastEdition: number;
	revision: number;
	/** when it was issued, or the draft was saved */
	at: Date;
	reader: Reader;
}

const seenBy: Record<Reader, string> = {
	typical: '',
	protan: 'as protan readers see it',
	deutan: 'as deutan readers see it',
	tritan: 'as tritan readers see it',
	grey: 'as grey print shows it',
};

/** What is printed on the sheet: a draft says in capitals that it is one, and another reader's view so. */
export function issueWords({ edition, lastEdition, revision, at, reader }: TakenOf): string {
	const what =
		edition !== null
			? `Edition ${edition}`
			: `DRAFT ${revision}, not issued${lastEdition > 0 ? `, after edition ${lastEdition}` : ''}`;
	return [`${what}, ${dayInWords(at)}`, seenBy[reader]].filter(Boolean).join(', ');
}

/** Beginning of the file's name, which says the same. */
export function exportStem({ sheetName, edition, revision, reader }: TakenOf): string {
	const what = edition !== null ? `edition-${edition}` : `draft-${revision}`;
	const seen = reader === 'typical' ? '' : `-${reader}`;
	return `${fileStem(sheetName)}-${what}${seen}`;
}

export const exportFileName = (stem: string, kind: ExportKindId): string =>
	`${stem}.${exportKind(kind).extension}`;
