import { spawnSync } from 'node:child_process';
import { accessSync, constants, existsSync } from 'node:fs';
import { Explained, say } from './say.mjs';

/**
 * Installs Debian packages, which root alone can do.
 * @param {string[]} packages @param {string} purpose
 */
export function aptInstall(packages, purpose) {
	if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) {
		const command = `apt-get install ${packages.join(' ')}`;
		throw new Explained(`${purpose} is missing. Install it as root with: ${command}`);
	}
	say(`Installing ${purpose} from Debian's packages ...`);
	if (aptGet(['install', ...packages])) return;
	if (aptGet(['update']) && aptGet(['install', ...packages])) return;
	throw new Explained(`${purpose} could not be installed, see above.`);
}

/** @param {string[]} args */
function aptGet(args) {
	const [what = '', ...packages] = args;
	const options = ['-y', '-qq', '-o', 'DPkg::Lock::Timeout=300'];
	const lean = what === 'install' ? ['--no-install-recommends'] : [];
	const { status } = spawnSync('apt-get', [what, ...options, ...lean, ...packages], {
		env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
		stdio: ['ignore', 'ignore', 'inherit'],
	});
	return status === 0;
}

/** @param {string} file */
export function executable(file) {
	try {
		accessSync(file, constants.X_OK);
		return true;
	} catch {
		return false;
	}
}
