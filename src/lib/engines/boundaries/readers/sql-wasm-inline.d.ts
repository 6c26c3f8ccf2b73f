/** The build of sql.js that carries its WebAssembly inside, so that no second file has to be found. */
declare module 'sql.js/dist/sql-wasm-inline.js' {
	import initSqlJs from 'sql.js';
	export default initSqlJs;
}
