import type { Role } from './roles.ts';

/** What each role gets done, in one line, for those who give roles out. */
export const roleWords: Record<Role, string> = {
	cartographer: 'Uploads and mends boundaries, decides borders, lays out the sheet',
	analyst: 'Joins measures, picks palettes, locks inks, asks for colourings',
	planner: 'Joins measures, assigns regions to territories, compares proposals, hands over moves',
	designer: 'Works on palettes and layout, takes the issued files',
	approver: 'Reads what changed, issues editions, approves handover lists',
	admin: 'Looks after members, tokens and the activity log',
};
