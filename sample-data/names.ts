import { randomStream } from './random.ts';

/** The naming style of the republic, made up for it: a stem, then an ending for the kind of place. */
const stems =
	'Ald Aun Bryl Cerr Corv Dask Dol Drenn Eym Falk Fenn Garr Gryv Hael Hurn Ilv Irr Jarl Jor Kell Kyrn Lauv Lesk Lorr Maun Merr Mirk Nauv Nelv Oss Ostr Pell Prin Quell Quor Rask Rhund Rov Sael Sarn Skerr Sorv Taun Thrav Thyr Tolv Ulv Urs Vask Velk Vorr Wend Wyrm Yld Ymm Zarr'.split(
		' ',
	);
const inland = 'ösk éval ondry ithe uvar embre ësten arroy öve ilde ançon œrn aške yst orra'.split(
	' ',
);
const shore = 'möre havn skær fjøl uñe strå ennes holme öya vik lîn sund'.split(' ');

const provinces = [
	'Auvérin',
	'Braskory',
	'Dølmark',
	'Estravel',
	'Garnöst',
	'Hinterquay',
	'Lœvendal',
	'Morråne',
	'Pelandrie',
	'Skarvöya',
	'Thyrrenor',
];

export const republicName = 'Tavaröe';
export const cityName = 'Tavarhavn';

export function provinceName(province: number): string {
	return provinces[province];
}

/** A name for each district, all different; those by the sea end in a word of the shore. */
export function districtNames(coastal: readonly boolean[], seed: number): string[] {
	const random = randomStream(seed);
	const used = new Set<string>();
	const pick = (list: readonly string[]) => list[Math.floor(random() * list.length)];
	return coastal.map((byTheSea) => {
		for (;;) {
			const ending = pick(byTheSea && random() < 0.7 ? shore : inland);
			const name = join(pick(stems), ending) + (random() < 0.04 ? pick([' Minor', ' Major']) : '');
			if (used.has(name)) continue;
			used.add(name);
			return name;
		}
	});
}

/** A doubled letter before a consonant is written once. */
function join(stem: string, ending: string): string {
	const startsWithVowel = /^[aeiouyéëöøœåîæ]/.test(ending);
	return startsWithVowel ? stem + ending : stem.replace(/(.)\1$/, '$1') + ending;
}
