/** `npm run bench [-- name ...]`: runs the benchmarks named, or all, and prints one JSON line a record. */
interface Benchmark {
	run(): AsyncIterable<object> | Promise<object[]>;
}

const benchmarks: Record<string, () => Promise<Benchmark>> = {
	boundaries: () => import('./boundaries.ts'),
	colouring: () => import('./colouring.ts'),
};

const wanted = process.argv.slice(2);
const unknown = wanted.filter((name) => !(name in benchmarks));
if (unknown.length) {
	console.error(
		`No such benchmark: ${unknown.join(', ')}. There are: ${Object.keys(benchmarks).join(', ')}.`,
	);
	process.exit(2);
}

for (const name of wanted.length ? wanted : Object.keys(benchmarks)) {
	const benchmark = await benchmarks[name]();
	for await (const record of await benchmark.run()) console.log(JSON.stringify(record));
}
