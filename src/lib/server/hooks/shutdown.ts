import { building } from '$app/environment';
import { disconnect } from '../database/connection.ts';
import { closeWorkshop } from '../jobs/workshop.ts';

/** Once the web server has answered its last request, what it holds open is closed, so that it can end. */
export function closeOnShutdown(): void {
	if (building) return;
	process.once('sveltekit:shutdown', () => {
		void closeWorkshop()
			.then(disconnect)
			.finally(() => process.exit(0));
	});
}
