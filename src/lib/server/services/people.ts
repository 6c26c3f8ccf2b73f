/** What a person is called on pages: their name, else the part of their address before the @. */
export const personName = (row: {
	by_name: string | null;
	by_email: string | null;
}): string | null => row.by_name ?? row.by_email?.split('@')[0] ?? null;
