import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { decodeCoverage } from '../../src/lib/engines/boundaries/index.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import { runIntake } from '../../src/lib/server/jobs/intake.job.ts';
import { tidy } from '../../src/lib/server/services/housekeeping.service.ts';
import { answerIntake } from '../../src/lib/server/services/intake-answer.service.ts';
import { cancelIntake, intakeStatus } from '../../src/lib/server/services/intake.service.ts';
import { Conflict, NotFound, Refused } from '../../src/lib/server/services/outcomes.ts';
import {
	forgetAnswer,
	rememberedAnswers,
} from '../../src/lib/server/services/reading-answers.service.ts';
import { beginFileRecut } from '../../src/lib/server/services/recut-begin.service.ts';
import { answerRecut } from '../../src/lib/server/services/recut-work.service.ts';
import { deskSheet, sheetGeometry } from '../../src/lib/server/services/sheet.service.ts';
import { before, plotsFile, plotsSheet, readOut } from '../support/recut-sheets.ts';
import { writeShapefileZip } from '../support/shapefile.ts';
import {
	createMember,
	createWorkshop,
	ingest,
	uploadRequest,
	type TestWorkshop,
} from '../support/workshop.ts';

let shop: TestWorkshop;
let member: Member;
beforeAll(async () => {
	shop = await createWorkshop();
	member = await createMember(shop.db, 'answers', 'cartographer');
});
afterAll(() => shop.close());

const answer = { choice: '', typed: '', keyField: '', nameField: '' };
const never = new AbortController().signal;

/** Squares of 1 km in metres somewhere, without a word on where; `shift` makes another file of the same kind. */
function metres(shift: number, column = 'code'): Uint8Array {
	const features = [0, 1].map((place) => {
		const [w, s] = [500_000 + 1_000 * place, 5_400_000 + shift];
		const ring = [
			[w, s],
			[w + 1_000, s],
			[w + 1_000, s + 1_000],
			[w, s + 1_000],
			[w, s],
		];
		return {
			type: 'Feature',
			properties: { [column]: `p${place}`, called: `Plot ${place}` },
			geometry: { type: 'Polygon', coordinates: [ring] },
		};
	});
	return writeShapefileZip({ features, name: 'plots' } as Parameters<typeof writeShapefileZip>[0]);
}

async function readOn(id: string) {
	await runIntake(shop, id, never);
	return intakeStatus(shop, member, id);
}

describe('a file that does not say where it lies', () => {
	it('is kept and asked about, never guessed', async () => {
		const asked = await ingest(shop, member, 'one.zip', metres(0));
		expect(asked).toMatchObject({ state: 'asking', refusal: null, sheet: null, remembered: [] });
		expect(asked.question).toMatchObject({ about: 'crs', free: true });
		expect(await shop.stored()).toHaveLength(1);
	});

	it('takes no answer that is none, and is still asked about', async () => {
		const { id } = await ingest(shop, member, 'two.zip', metres(10));
		const wrong = answerIntake(shop, member, id, { ...answer, choice: 'somewhere' });
		await expect(wrong).rejects.toBeInstanceOf(Refused);
		const slip = answerIntake(shop, member, id, { ...answer, typed: 'EPSG:99999' });
		await expect(slip).rejects.toMatchObject({ field: 'typed' });
		const column = { ...answer, typed: 'EPSG:32632', keyField: 'nowhere' };
		await expect(answerIntake(shop, member, id, column)).rejects.toMatchObject({
			field: 'keyField',
		});
		expect((await intakeStatus(shop, member, id)).state).toBe('asking');
		await cancelIntake(shop, member, id);
		expect(await shop.stored()).toHaveLength(1);
	});

	it('is read on with the answer, and nobody is asked twice', async () => {
		const { id } = await ingest(shop, member, 'three.zip', metres(20));
		await answerIntake(shop, member, id, { ...answer, typed: 'EPSG:32632', keyField: 'code' });
		const again = answerIntake(shop, member, id, { ...answer, typed: 'EPSG:32632' });
		await expect(again).rejects.toBeInstanceOf(Conflict);
		const done = await readOn(id);
		expect(done).toMatchObject({ state: 'done', question: null, remembered: [] });
		const { boundarySet, regions } = await deskSheet(shop, member, done.sheet ?? 0);
		expect(boundarySet.options).toEqual({ crs: 'EPSG:32632', keyField: 'code' });
		// zone 32 has its middle at 9 degrees east and 500 km of false easting (EPSG register, 32632)
		const { read } = await sheetGeometry(shop, member, done.sheet ?? 0);
		const { arcPoints } = decodeCoverage(new Uint8Array(await read()));
		const west = Math.min(...arcPoints.filter((_, i) => i % 2 === 0));
		expect(west).toBeCloseTo(9, 6);
		expect(boundarySet.source.crs).toBe('EPSG:32632');
		expect(regions.key).toEqual(['p0', 'p1']);
	});

	it('the next that looks alike is read by the same answer, and says so', async () => {
		const next = await ingest(shop, member, 'four.zip', metres(30));
		expect(next).toMatchObject({ state: 'done', question: null });
		expect(next.remembered.map(({ about, words }) => [about, words])).toContainEqual([
			'crs',
			'EPSG:32632',
		]);
		expect(next.remembered[0]).toMatchObject({
			fileName: 'three.zip',
			answeredBy: 'cartographer of answers',
		});
		const { boundarySet } = await deskSheet(shop, member, next.sheet ?? 0);
		expect(boundarySet.options.crs).toBe('EPSG:32632');
	});

	it('what is said for the file goes before what is remembered', async () => {
		const own = await ingest(shop, member, 'five.zip', metres(40), { crs: 'EPSG:32633' });
		expect(own.state).toBe('done');
		const { boundarySet } = await deskSheet(shop, member, own.sheet ?? 0);
		expect(boundarySet.source.crs).toBe('EPSG:32633');
	});

	it('another kind of file, and another team, are asked anew', async () => {
		const other = await ingest(shop, member, 'six.zip', metres(50, 'number'));
		expect(other.state).toBe('asking');
		const stranger = await createMember(shop.db, 'others', 'cartographer');
		const theirs = await ingest(shop, stranger, 'seven.zip', metres(60));
		expect(theirs.state).toBe('asking');
		expect(await rememberedAnswers(shop, stranger)).toEqual([]);
		const notOurs = answerIntake(shop, member, theirs.id, { ...answer, typed: 'EPSG:32632' });
		await expect(notOurs).rejects.toBeInstanceOf(NotFound);
	});

	it('an answer can be forgotten by the team that gave it', async () => {
		const [known] = (await rememberedAnswers(shop, member)).filter(({ about }) => about === 'crs');
		const stranger = await createMember(shop.db, 'others', 'admin');
		const taken = forgetAnswer(shop, stranger, 'crs', known.likeness);
		await expect(taken).rejects.toBeInstanceOf(NotFound);
		await forgetAnswer(shop, member, 'crs', known.likeness);
		expect((await ingest(shop, member, 'eight.zip', metres(70))).state).toBe('asking');
		const analyst = await createMember(shop.db, 'answers', 'analyst');
		expect(await rememberedAnswers(shop, analyst)).toEqual([]);
	});
});

describe('key and name columns', () => {
	it('are remembered for files with the same columns, unless others are named', async () => {
		const fields = { keyField: 'called', nameField: 'code' };
		await ingest(shop, member, 'first.geojson', plotsFile(before), fields);
		const next = await ingest(shop, member, 'next.geojson', plotsFile(before.slice(1)));
		expect(next.remembered).toMatchObject([
			{ about: 'columns', words: 'keys from called, names from code', fileName: 'first.geojson' },
		]);
		expect((await deskSheet(shop, member, next.sheet ?? 0)).regions.key[0]).toBe('Plot b');
		const named = await ingest(shop, member, 'named.geojson', plotsFile(before), {
			keyField: 'code',
		});
		expect(named.remembered).toEqual([]);
		expect((await deskSheet(shop, member, named.sheet ?? 0)).regions.key[0]).toBe('a');
	});
});

describe('a re-cut', () => {
	it('asks in the same way, and goes on with the answer', async () => {
		const sheet = await plotsSheet(shop, member);
		const request = uploadRequest('later.zip', metres(80));
		const { number } = await beginFileRecut(shop, member, sheet, request);
		const asked = await readOut(shop, member, sheet, number);
		expect(asked).toMatchObject({ state: 'asking', question: { about: 'crs' }, change: null });
		await answerRecut(shop, member, sheet, number, { ...answer, typed: 'EPSG:32632' });
		const ready = await readOut(shop, member, sheet, number);
		expect(ready).toMatchObject({ state: 'ready', question: null, options: { crs: 'EPSG:32632' } });
		expect(ready.change?.regions.after).toBe(2);
	});
});

describe('a question that nobody answers', () => {
	it('is let go after thirty days, with its file', async () => {
		const { id } = await ingest(shop, member, 'late.zip', metres(90, 'late'));
		const files = (await shop.stored()).length;
		await tidy(shop.db, shop.files);
		expect((await intakeStatus(shop, member, id)).state).toBe('asking');
		const old = new Date(Date.now() - 31 * 86_400_000);
		await shop.db.updateTable('intakes').set({ updated_at: old }).where('id', '=', id).execute();
		await tidy(shop.db, shop.files);
		expect(await intakeStatus(shop, member, id)).toMatchObject({
			state: 'cancelled',
			question: null,
		});
		expect(await shop.stored()).toHaveLength(files - 1);
	});
});
