import { config } from '../config.ts';
import { membership } from './teams.service.ts';

/** The team that `npm start` makes for trying the product. */
export const demoTeam = { slug: 'tavaroe-survey', name: 'Tavaröe Survey Office' };

/** In demo mode, and there only for the admin of the demo team. */
export async function mayReadDemoMail(userId: string): Promise<boolean> {
	if (!config().demo) return false;
	const member = await membership(demoTeam.slug, userId);
	return member?.roles.includes('admin') ?? false;
}
