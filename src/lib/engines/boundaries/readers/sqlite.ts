import type { Database, SqlValue } from 'sql.js';
import { Refusal } from '../refusal.ts';

/** The 16 bytes that an SQLite 3 database begins with. */
export const sqliteMagic = [...'SQLite format 3\0'].map((c) => c.charCodeAt(0));

/** A value of a row; whole numbers come as bigint, so that none is rounded. */
export type Value = Exclude<SqlValue, number> | number | bigint;

/** The package's types leave out that whole numbers can be had as bigint. */
interface ExactStatement {
	get(parameters: null, config: { useBigInt: true }): Value[];
}

/**
 * An SQLite database held in memory by `sql.js` (SQLite as WebAssembly, loaded on first use), of which
 * only plain tables can be read: a view or a virtual table may compute without end, and a generated
 * column may make values of any size. Call `close` when done.
 */
export class Sqlite {
	private constructor(private database: Database) {}

	static async open(bytes: Uint8Array): Promise<Sqlite> {
		checkHeader(bytes);
		const { default: start } = await import('sql.js/dist/sql-wasm-inline.js');
		const { Database } = await start();
		const opened = new Sqlite(new Database(bytes));
		opened.guard(() =>
			opened.database.exec('PRAGMA trusted_schema = OFF; PRAGMA cache_size = -4096'),
		);
		return opened;
	}

	close(): void {
		this.database.close();
	}

	/** Whether a plain table of this name is there; refuses one that is a view or virtual. */
	hasTable(name: string): boolean {
		const sql = 'SELECT type, sql FROM sqlite_master WHERE name = ? COLLATE NOCASE';
		const found = [...this.rows(sql, [name])].find(([type]) => type === 'table' || type === 'view');
		if (!found) return false;
		if (found[0] === 'view' || /^\s*CREATE\s+VIRTUAL\b/i.test(String(found[1]))) {
			const message = `"${name}" is computed by the database, not stored in it, and is not read. Save it as a table.`;
			throw new Refusal('unsupported-format', message);
		}
		return true;
	}

	/** The stored columns of a table, in order. */
	columns(table: string): { name: string; type: string; primary: boolean }[] {
		const rows = this.rows(`PRAGMA table_xinfo(${quoted(table)})`);
		// columns: cid, name, type, notnull, dflt_value, pk, hidden
		return [...rows]
			.filter((row) => Number(row[6]) === 0)
			.map((row) => ({
				name: String(row[1]),
				type: String(row[2]),
				primary: Number(row[5]) === 1,
			}));
	}

	*rows(sql: string, parameters: SqlValue[] = []): Generator<Value[]> {
		const statement = this.guard(() => this.database.prepare(sql, parameters));
		try {
			while (this.guard(() => statement.step())) {
				yield this.guard(() =>
					(statement as unknown as ExactStatement).get(null, { useBigInt: true }),
				);
			}
		} finally {
			statement.free();
		}
	}

	/** What SQLite says of a broken database becomes a refusal. */
	private guard<T>(work: () => T): T {
		try {
			return work();
		} catch (error) {
			const said = error instanceof Error ? error.message : String(error);
			throw new Refusal('file-damaged', `The database cannot be read: ${said}.`);
		}
	}
}

/** A name as SQL takes it, whatever stands in it. */
export const quoted = (name: string): string => `"${name.replaceAll('"', '""')}"`;

/** The size that the header declares (SQLite file format, 1.3) against the bytes there are. */
function checkHeader(bytes: Uint8Array): void {
	if (bytes.length < 100) throw cutOff(bytes.length, 100);
	const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
	const written = view.getUint16(16);
	const page = written === 1 ? 65536 : written;
	if (page < 512 || (page & (page - 1)) !== 0) {
		throw new Refusal('file-damaged', `The database declares pages of ${page} bytes.`);
	}
	// the count is to be believed only where the two change counters agree
	const pages = view.getUint32(24) === view.getUint32(92) ? view.getUint32(28) : 0;
	if (pages * page > bytes.length) throw cutOff(bytes.length, pages * page);
}

function cutOff(has: number, wants: number): Refusal {
	const message = `The database has ${has} bytes but needs ${wants}; it is cut off.`;
	return new Refusal('file-truncated', message);
}
