/** The log's actions in sentences. An action without one is shown by its own words. */
const sentences: Record<string, string> = {
	'team.created': 'made the team',
	'team.renamed': 'gave the team another name',
	'member.invited': 'invited somebody',
	'member.invitation-withdrawn': 'withdrew an invitation',
	'member.joined': 'joined the team',
	'member.roles-changed': 'changed the roles of a member',
	'member.removed': 'removed a member',
	'member.left': 'left the team',
	'token.made': 'made an API token',
	'token.withdrawn': 'withdrew an API token',
	'palette.added': 'added a palette',
	'palette.changed': 'changed a palette',
	'palette.deleted': 'removed a palette',
	'palette.approved': 'approved a palette',
	'palette.approval-ended': 'took the approval of a palette back',
	'template.kept': 'kept a layout as a template',
	'template.replaced': 'gave a template another layout',
	'template.renamed': 'gave a template another name',
	'template.deleted': 'removed a template',
	'template.applied': 'set a sheet by a template',
	'draft.arranged': 'arranged the inks of a sheet',
	'export.asked': 'asked for a file',
	'export.made': 'has a file that was made',
	'export.failed': 'has a file that could not be made',
	'export.stopped': 'stopped the making of a file',
	'search.asked': 'had a colouring tried longer',
	'search.stored': 'has a better answer from a longer try',
	'search.ended': 'has a longer try that has ended',
	'search.failed': 'has a longer try that failed',
	'search.stopped': 'stopped a longer try',
	'measures.uploaded': 'uploaded a table of figures',
	'measures.read-again': 'had a table of figures read another way',
	'measures.reviewed': 'decided about a table of figures',
	'measures.taken': 'took figures over',
	'measures.joined-again': 'joined a table of figures to the present regions',
	'measures.table-dropped': 'dropped a table of figures',
	'measures.measure-dropped': 'dropped a measure',
	'handover.made': 'made a handover list',
	'handover.reason-changed': 'changed the reason of a move',
	'handover.move-proposed': 'put a move back to proposed',
	'handover.move-accepted': 'marked a move as accepted',
	'handover.move-disputed': 'marked a move as disputed',
	'handover.confirmed': 'confirmed a handover list after a change',
	'handover.withdrawn': 'withdrew a handover list',
	'handover.approved': 'approved a handover list',
	'handover.letters-sent': 'sent letters with a handover list',
	'handover.letter-ended': 'ended the link of a letter',
	'handover.answered': 'took answers that came by a letter',
};

export const actionWords = (action: string): string =>
	sentences[action] ?? action.replace(/[.-]/g, ' ');

/** The detail kept with an entry, in a line of plain words. */
export const detailWords = (detail: Record<string, unknown>): string =>
	Object.entries(detail)
		.map(([name, value]) => `${name.replace(/[_-]/g, ' ')}: ${valueWords(value)}`)
		.join('; ');

function valueWords(value: unknown): string {
	if (Array.isArray(value)) return value.map(valueWords).join(', ');
	if (value === null || value === undefined) return 'none';
	return typeof value === 'object' ? JSON.stringify(value) : String(value);
}
