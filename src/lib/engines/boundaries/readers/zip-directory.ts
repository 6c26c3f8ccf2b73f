import { Refusal } from '../refusal.ts';

/** One file of an archive as its directory declares it. */
export interface ZipEntry {
	name: string;
	method: number;
	crc: number;
	packedBytes: number;
	declaredBytes: number;
	/** offset of its local header */
	offset: number;
}

const endMark = 0x06054b50;
const entryMark = 0x02014b50;
const endBytes = 22;
const entryBytes = 46;

/** The directory of a zip archive (PKWARE APPNOTE 6.3, 4.3.12 and 4.3.16), folders left out. */
export function zipDirectory(bytes: Uint8Array): ZipEntry[] {
	const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
	const end = findEnd(view);
	const count = view.getUint16(end + 10, true);
	let at = view.getUint32(end + 16, true);
	if (count === 0xffff || at === 0xffffffff)
		throw damaged('it is of the 64-bit kind, which is not read');
	const entries: ZipEntry[] = [];
	for (let i = 0; i < count; i++) {
		if (at + entryBytes > end || view.getUint32(at, true) !== entryMark) {
			throw damaged(`its directory breaks off after ${i} of ${count} files`);
		}
		const nameBytes = view.getUint16(at + 28, true);
		const isUtf8 = (view.getUint16(at + 8, true) & 0x800) !== 0;
		if (view.getUint16(at + 8, true) & 1) throw damaged('it is locked with a password');
		const raw = bytes.subarray(at + entryBytes, at + entryBytes + nameBytes);
		const name = new TextDecoder(isUtf8 ? 'utf-8' : 'latin1').decode(raw);
		checkPath(name);
		if (!name.endsWith('/')) {
			entries.push({
				name,
				method: view.getUint16(at + 10, true),
				crc: view.getUint32(at + 16, true),
				packedBytes: view.getUint32(at + 20, true),
				declaredBytes: view.getUint32(at + 24, true),
				offset: view.getUint32(at + 42, true),
			});
		}
		at += entryBytes + nameBytes + view.getUint16(at + 30, true) + view.getUint16(at + 32, true);
	}
	return entries;
}

/** The end record stands last, before a comment of at most 65,535 bytes. */
function findEnd(view: DataView): number {
	const least = Math.max(0, view.byteLength - endBytes - 0xffff);
	for (let at = view.byteLength - endBytes; at >= least; at--) {
		if (view.getUint32(at, true) === endMark) return at;
	}
	throw damaged('it has no directory at its end, so it is probably cut off');
}

/** A name that would leave the folder it is unpacked to has no business in a boundary file. */
function checkPath(name: string): void {
	const climbs = name.split(/[/\\]/).includes('..');
	if (climbs || /^[/\\]|^[a-z]:|\0/i.test(name)) {
		throw damaged(`it holds a path that climbs out of its folder ("${name.slice(0, 80)}")`);
	}
}

export function damaged(what: string): Refusal {
	return new Refusal('zip-damaged', `The archive cannot be read: ${what}.`);
}
