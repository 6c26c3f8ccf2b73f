import { Refusal } from '../refusal.ts';

/** Bytes of the envelope by its indicator: none, xy, xyz, xym, xyzm; 5 to 7 are not defined. */
const envelopeBytes = [0, 32, 48, 48, 64];
const headerBytes = 8;

/**
 * The well-known binary inside a GeoPackage geometry (OGC 12-128r19, clause 2.1.3): the header is checked
 * and passed over. Null where the header says that the geometry is empty.
 */
export function wkbOf(bytes: Uint8Array, place: string): Uint8Array | null {
	const damaged = (what: string) =>
		new Refusal('file-damaged', `${place} cannot be read: ${what}.`);
	if (bytes.length < headerBytes) throw damaged(`its geometry has ${bytes.length} bytes`);
	if (bytes[0] !== 0x47 || bytes[1] !== 0x50)
		throw damaged('its geometry does not begin with "GP"');
	if (bytes[2] !== 0) throw damaged(`its geometry is of version ${bytes[2] + 1}`);
	const flags = bytes[3];
	if (flags & 0x20) {
		const message = `${place} has a geometry of an extended kind, which is not read.`;
		throw new Refusal('unsupported-format', message);
	}
	const envelope = envelopeBytes[(flags >> 1) & 7];
	if (envelope === undefined) throw damaged('its envelope is of an unknown kind');
	if (bytes.length < headerBytes + envelope) throw damaged('its geometry ends in its header');
	return flags & 0x10 ? null : bytes.subarray(headerBytes + envelope);
}
