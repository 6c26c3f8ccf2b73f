import { createHash } from 'node:crypto';
import type { ExportAbout, ExportKindId } from '../../engines/exports/index.ts';
import { canonicalJson } from '../../engines/editions/canonical-json.ts';
import type { Reader } from '../../engines/palettes/index.ts';
import type { Member } from '../access/member.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import type { ExportGround } from './export-ground.ts';
import { sheetLanguage } from '../jobs/sheet-language.ts';
import { themeTag } from './theme-on-sheet.ts';
import { exportStem, issueWords } from './export-words.ts';

/** A request as it is stored: everything that decides the bytes is said. */
export interface ExportRequest {
	edition: number | null;
	revision: number;
	kind: ExportKindId;
	options: Record<string, unknown>;
	reader: Reader;
}

/** What the file says about itself. */
export function aboutExport(
	team: Pick<Member['team'], 'name'>,
	sheet: Pick<SheetRecord, 'name'>,
	ground: ExportGround,
	asked: Pick<ExportRequest, 'edition' | 'revision' | 'reader'>,
): ExportAbout {
	const { edition, revision, reader } = asked;
	const { lastEdition, at, draft, digest } = ground;
	const taken = { sheetName: sheet.name, edition, lastEdition, revision, at, reader };
	return {
		title: draft.layout.title || sheet.name,
		issue: issueWords(taken),
		date: at.toISOString(),
		author: team.name,
		digest,
		credits: draft.layout.credits,
		stem: exportStem(taken),
		language: sheetLanguage,
	};
}

/** The same for two requests that give the same bytes, and different where the bytes may differ. */
export function requestDigest(
	asked: ExportRequest,
	about: ExportAbout,
	{ view, theme, further }: Pick<ExportGround, 'view' | 'theme' | 'further'>,
): string {
	const { edition, revision, kind, options, reader } = asked;
	const boundarySetId = view.set.id;
	const said = {
		...{ edition, revision, kind, options, reader, about, boundarySetId },
		...(theme && { theme: themeTag(theme) }),
		...(further.territories && { territories: further.territories }),
		...(further.figures && { figures: further.figures }),
	};
	return createHash('sha256').update(canonicalJson(said)).digest('hex');
}
