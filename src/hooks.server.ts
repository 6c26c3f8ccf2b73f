import { sequence } from '@sveltejs/kit/hooks';
import { handleBooth } from '$lib/server/hooks/booth';

export const handle = sequence(handleBooth);
