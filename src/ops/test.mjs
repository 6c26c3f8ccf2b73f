import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { run, endChildren, exitOnSignals } from './children.mjs';
import { ensureChromium } from './chromium.mjs';
import { ensureDependencies } from './install.mjs';
import { ensurePoppler } from './poppler.mjs';
import { startPostgres } from './postgres.mjs';
import { startProduct } from './product.mjs';

/**
 * `npm test`: provides what is missing, then lint, types, unit, property and published-value tests, the
 * database and fault tests on a PostgreSQL of their own, and the browser journeys on a product started
 * for them. Every suite runs even when an earlier one failed; the last line counts them all.
 *
 * `npm test -- engines database` runs only the named suites.
 */
const dataDir = resolve(process.env.MERESTONE_TEST_DATA ?? '.data/test');
const wanted = process.argv.slice(2);
const totals = { passed: 0, failed: 0 };

/** @param {string} name */
const isWanted = (name) => wanted.length === 0 || wanted.includes(name);

/** @param {boolean} ok @param {string} what */
function count(ok, what) {
	totals[ok ? 'passed' : 'failed'] += 1;
	if (!ok) console.error(`FAILED: ${what}`);
}

/** Runs a command that is one check by its exit code. @param {string} what @param {string[]} command */
async function check(what, command) {
	const started = Date.now();
	const code = await run(command[0], command.slice(1), {});
	console.log(`${what}: ${code === 0 ? 'passed' : 'failed'} in ${seconds(started)}`);
	count(code === 0, what);
}

/** Runs one vitest project and adds up its tests. @param {string} project @param {Record<string, string>} env */
async function suite(project, env = {}) {
	const report = join(dataDir, `${project}.json`);
	rmSync(report, { force: true });
	const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
	const code = await run('npx', ['vitest', 'run', '--project', project, ...reporters], env);
	const result = readReport(report);
	totals.passed += result.passed;
	totals.failed += result.failed;
	if (result.passed + result.failed === 0) count(false, `${project}: no test ran`);
	else if (code !== 0 && result.failed === 0) count(false, `${project} ended with code ${code}`);
}

/** @param {string} file */
function readReport(file) {
	try {
		const report = JSON.parse(readFileSync(file, 'utf8'));
		const broken = report.testResults.filter(
			(/** @type {{ status: string, assertionResults: unknown[] }} */ suite) =>
				suite.status === 'failed' && suite.assertionResults.length === 0,
		).length;
		return { passed: report.numPassedTests, failed: report.numFailedTests + broken };
	} catch (error) {
		console.error(`no report from vitest: ${error}`);
		return { passed: 0, failed: 0 };
	}
}

/** @param {number} started */
const seconds = (started) => `${Math.round((Date.now() - started) / 1000)} s`;

async function everySuite() {
	if (isWanted('lint')) {
		await check('formatting', ['npx', 'prettier', '--check', '.']);
		await check('lint', ['npx', 'eslint', '.']);
	}
	if (isWanted('types')) await check('types', ['npm', 'run', '--silent', 'check']);
	if (isWanted('engines')) {
		ensurePoppler();
		await suite('engines');
	}
	if (!isWanted('database') && !isWanted('journeys')) return;
	const database = await startPostgres(join(dataDir, 'postgres'), { fresh: true });
	try {
		if (isWanted('database')) await suite('database', { DATABASE_URL: database.url });
		if (isWanted('journeys')) await journeys(database.url);
	} finally {
		await database.stop();
	}
}

/** @param {string} databaseUrl */
async function journeys(databaseUrl) {
	ensureChromium();
	const product = await startProduct({ databaseUrl, dataDir: join(dataDir, 'product') });
	try {
		await suite('journeys', { MERESTONE_URL: product.url, MERESTONE_DATA: product.dataDir });
	} finally {
		await product.stop();
	}
}

exitOnSignals();
const started = Date.now();
mkdirSync(dataDir, { recursive: true });
try {
	await ensureDependencies();
	await run('npx', ['svelte-kit', 'sync'], {});
	await everySuite();
} catch (error) {
	console.error(error);
	count(false, 'the test run itself');
} finally {
	await endChildren();
}
console.log(`\nall suites in ${seconds(started)}`);
console.log(`${totals.passed} passed, ${totals.failed} failed`);
process.exit(totals.failed === 0 && totals.passed > 0 ? 0 : 1);
