import { checkPalette, mendPalette } from '../../../engines/palettes/index.ts';
import { paletteRequest, type PaletteRequest } from '../../../schemas/api/check-palette.ts';
import { answered, statsSince, type Answer } from '../../api/answer.ts';
import { ApiFault } from '../../api/fault.ts';
import { parseJson } from '../../api/read-json.ts';
import type { Task } from '../task-port.ts';

/** `POST /check/palette`, from the bytes of the body to those of the answer. */
export const checkPaletteJson = ({ input }: Task<Uint8Array>): Promise<Answer> =>
	answered(() => {
		const request = parseJson(input, paletteRequest);
		requireInks(request);
		const { inks, touching, locked, thresholds, mend, seed } = request;
		const started = performance.now();
		const verdict = checkPalette(inks, touching, thresholds);
		const mended = mend ? mendPalette({ inks, touching, locked, thresholds, seed }) : null;
		return { ...verdict, mend: mended, stats: statsSince(started) };
	});

/** Numbers of inks must be those of inks that are there. */
function requireInks({ inks, touching, locked }: PaletteRequest): void {
	const pairs = touching === 'all' ? [] : touching;
	const wrong = (path: string, message: string) =>
		new ApiFault(400, 'malformed', `${path}: ${message}`, { issues: [{ path, message }] });
	pairs.forEach(([a, b], place) => {
		if (a === b) throw wrong(`touching.${place}`, 'an ink does not touch itself');
		if (Math.max(a, b) >= inks.length) throw wrong(`touching.${place}`, 'there is no such ink');
	});
	locked.forEach((ink, place) => {
		if (ink >= inks.length) throw wrong(`locked.${place}`, 'there is no such ink');
	});
}
