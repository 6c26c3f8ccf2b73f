import { TableRefusal } from '../refusal.ts';

export const damaged = (what: string): TableRefusal =>
	new TableRefusal('workbook-damaged', `The workbook is damaged and cannot be read: ${what}.`);
