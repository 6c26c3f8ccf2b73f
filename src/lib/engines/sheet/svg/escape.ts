/** Characters XML 1.0 (section 2.2) does not allow in any form, not even escaped. */
const illegal = /[^\t\n\r\u{20}-\u{d7ff}\u{e000}-\u{fffd}\u{10000}-\u{10ffff}]/gu;
const entities: Record<string, string> = {
	'&': '&amp;',
	'<': '&lt;',
	'>': '&gt;',
	'"': '&quot;',
	"'": '&#39;',
	// white space in attributes would be read back as spaces
	'\t': '&#9;',
	'\n': '&#10;',
	'\r': '&#13;',
};

/** Text that may stand in an XML element or between either kind of quotes, and reads back as it was. */
export function escapeXml(text: string): string {
	return text.replace(illegal, '').replace(/[&<>"'\t\n\r]/g, (character) => entities[character]);
}
