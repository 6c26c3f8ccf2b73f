const chunk = 32_766;

/** Base 64 of bytes (RFC 4648, section 4), in pieces, because spreading a whole font overflows a call. */
export function base64(bytes: Uint8Array): string {
	let text = '';
	for (let start = 0; start < bytes.length; start += chunk) {
		text += btoa(String.fromCharCode(...bytes.subarray(start, start + chunk)));
	}
	return text;
}
