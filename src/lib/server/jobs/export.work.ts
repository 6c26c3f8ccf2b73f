import {
	exportFile,
	furtherColumns,
	type ExportAbout,
	type ExportKindId,
	type ExportOutcome,
} from '../../engines/exports/index.ts';
import { knownGaps } from '../../engines/borders/known-gaps.ts';
import { sheetTable } from '../../engines/sheet/index.ts';
import { faceFiles } from './faces.ts';
import { drawInput, type FilesInput } from './paint.work.ts';
import { rasterise } from './rasterise.ts';
import { teller, type Task } from './task-port.ts';

export interface ExportInput extends FilesInput {
	kind: ExportKindId;
	/** those of the kind, each of them said */
	options: Record<string, unknown>;
	about: ExportAbout;
	/** in region order */
	names: string[];
}

/** Draws a sheet and writes it as one file; the same input gives the same bytes. */
export async function makeExport({ input, port }: Task<ExportInput>): Promise<ExportOutcome> {
	const tell = teller(port);
	tell('Drawing the sheet', 0.05);
	const { coverage, drawing } = drawInput(input);
	tell('Writing the file', 0.4);
	const { kind, options, about, groups, names, draft } = input;
	const { keys } = coverage;
	const rows = sheetTable(drawing, coverage, groups);
	const source = {
		...{ drawing, coverage, about, fonts: faceFiles(), rows },
		columns: furtherColumns(rows, input.further),
		borders: {
			title: about.title,
			keys,
			names,
			borders: knownGaps(input.borders, draft.waterKm),
			rules: draft,
		},
	};
	return exportFile(kind, source, options, {
		rasterise,
		progress: (step, share) => tell(step, 0.4 + 0.6 * share),
	});
}
