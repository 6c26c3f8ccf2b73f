import { noSuchRoute } from '$lib/server/api/route';

export const fallback = noSuchRoute;
