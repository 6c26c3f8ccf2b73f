import { cleanText } from '../sheet/type/clean-text.ts';
import { caution } from '../sheet/layout.ts';
import { exportKinds } from './kinds.ts';
import { zipOfFiles } from './repeatable-zip.ts';
import type { ExportAbout, ExportedFile } from './source.ts';

/**
 * Files of one sheet as a zip: the files, `read-me.txt`, and `SHA-256.txt` with the digest of each (FIPS
 * 180-4) in the form that the usual check programs read. The same files give the same bytes.
 */
export async function packFiles(
	files: readonly ExportedFile[],
	about: ExportAbout,
): Promise<Uint8Array> {
	const told = [...files, { name: 'read-me.txt', bytes: encode(readMe(files, about)) }];
	const digests = await Promise.all(
		told.map(async ({ name, bytes }) => `${await sha256(bytes)}  ${name}\n`),
	);
	return zipOfFiles([...told, { name: 'SHA-256.txt', bytes: encode(digests.join('')) }]);
}

const encode = (text: string): Uint8Array => new TextEncoder().encode(text);

async function sha256(bytes: Uint8Array): Promise<string> {
	const hash = new Uint8Array(
		await crypto.subtle.digest('SHA-256', bytes as Uint8Array<ArrayBuffer>),
	);
	return Array.from(hash, (byte) => byte.toString(16).padStart(2, '0')).join('');
}

function readMe(files: readonly ExportedFile[], about: ExportAbout): string {
	const line = (what: string, value: string) => (value ? [`${what}: ${cleanText(value)}`] : []);
	const listed = files.map(({ name }) => {
		const kind = exportKinds.find(({ extension }) => name === `${about.stem}.${extension}`);
		return `${name}\n    ${kind ? `${kind.words}. ${kind.use}` : ''}`;
	});
	const notes = files.flatMap(({ name, notes: said }) => said.map((note) => `${name}: ${note}`));
	return `${[
		cleanText(about.title),
		...line('Issue', about.issue),
		...line('Team', about.author),
		...line('Date (UTC)', about.date.slice(0, 10)),
		...line('Content digest (SHA-256)', about.digest ?? ''),
		...line('Boundaries', about.credits),
		'',
		...listed,
		'',
		...(notes.length ? [...notes, ''] : []),
		'SHA-256.txt lists the digest of every file; "sha256sum -c SHA-256.txt" checks them.',
		'',
		caution,
	].join('\n')}\n`;
}
