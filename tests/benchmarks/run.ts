/** `npm run bench [-- name ...]`: runs the benchmarks named, or all, and prints one JSON line a record. */
interface Benchmark {
	run(): AsyncIterable<object> | Promise<object[]>;
}

const alone = ['boundaries', 'colouring', 'goals', 'lettering', 'sheet', 'tables', 'territories'];
/** run only when named, because a product must be running */
const withProduct = ['large-sheet', 'lock-toggle'];
const names = [...alone, ...withProduct];

const wanted = process.argv.slice(2);
const unknown = wanted.filter((name) => !names.includes(name));
if (unknown.length) {
	console.error(`No such benchmark: ${unknown.join(', ')}. There are: ${names.join(', ')}.`);
	process.exit(2);
}

for (const name of wanted.length ? wanted : alone) {
	const benchmark = (await import(`./${name}.ts`)) as Benchmark;
	for await (const record of await benchmark.run()) console.log(JSON.stringify(record));
}

export type { Benchmark };
