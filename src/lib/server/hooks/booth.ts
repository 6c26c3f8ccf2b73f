import type { Handle } from '@sveltejs/kit';
import { boothCookie, readBooth } from '$lib/state/booth';

/** Writes the user's booth into the page before it is sent, so that nothing flashes on arrival. */
export const handleBooth: Handle = ({ event, resolve }) =>
	resolve(event, {
		transformPageChunk: ({ html }) =>
			html.replace('%booth%', readBooth(event.cookies.get(boothCookie)) ?? 'system'),
	});
