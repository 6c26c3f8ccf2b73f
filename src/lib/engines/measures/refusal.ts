/** Why a file is no table that can be read. */
export type TableRefusalCode =
	| 'empty-file'
	| 'no-rows'
	| 'file-too-large'
	| 'too-many-rows'
	| 'too-many-columns'
	| 'too-many-cells'
	| 'too-large-unpacked'
	| 'row-too-long'
	| 'quotes-broken'
	| 'blanks-too-many'
	| 'old-workbook'
	| 'encrypted'
	| 'binary-workbook'
	| 'open-document'
	| 'not-a-workbook'
	| 'workbook-damaged'
	| 'web-page'
	| 'xml'
	| 'not-text'
	| 'unknown-encoding'
	| 'bad-option'
	| 'no-such-sheet'
	| 'no-such-row';

/** Ends the reading of a file from any depth; `readTable` turns it into a refused result. */
export class TableRefusal extends Error {
	constructor(
		readonly code: TableRefusalCode,
		message: string,
	) {
		super(message);
	}
}
