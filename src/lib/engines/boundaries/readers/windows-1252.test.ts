import { expect, it } from 'vitest';
import { textDecoder } from './windows-1252.ts';

// WHATWG Encoding Standard, index windows-1252
it('reads the letters of windows-1252 that ISO 8859-1 does not have', () => {
	const bytes = Uint8Array.of(
		0x80,
		0x8c,
		0x9c,
		0x8a,
		0x9a,
		0x8e,
		0x9e,
		0x9f,
		0x93,
		0x85,
		0xe9,
		0x41,
	);
	expect(textDecoder('windows-1252').decode(bytes)).toBe('€ŒœŠšŽžŸ“…éA');
	expect(textDecoder('latin1').decode(Uint8Array.of(0x9a))).toBe('š');
});

it('leaves other encodings to the platform', () => {
	expect(textDecoder('utf-8').decode(new TextEncoder().encode('Morråne, Мост'))).toBe(
		'Morråne, Мост',
	);
	expect(textDecoder('windows-1251').decode(Uint8Array.of(0xcc))).toBe('М');
});
