import { building } from '$app/environment';
import { sequence } from '@sveltejs/kit/hooks';
import { handleAddress } from '$lib/server/hooks/address';
import { handleAuth } from '$lib/server/hooks/auth';
import { handleBooth } from '$lib/server/hooks/booth';
import { handleGuard } from '$lib/server/hooks/guard';
import { handleHeaders } from '$lib/server/hooks/headers';
import { handleBodySize, handleRate } from '$lib/server/hooks/limits';
import { handleOrigin } from '$lib/server/hooks/origin';
import { handleError, handleRequest } from '$lib/server/hooks/request';
import { handleSession } from '$lib/server/hooks/session';
import { warmUp } from '$lib/server/jobs/workshop';
import { closeOnShutdown } from '$lib/server/hooks/shutdown';

/** What happens to every request, from the outside in. */
export const handle = sequence(
	handleRequest,
	handleHeaders,
	handleAddress,
	handleOrigin,
	handleBodySize,
	handleAuth,
	handleSession,
	handleRate,
	handleGuard,
	handleBooth,
);

export const init = () => {
	closeOnShutdown();
	if (!building) warmUp();
};

export { handleError };
