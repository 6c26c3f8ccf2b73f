/** What `GET sheets/[sheet]/column` answers: one column of the boundary file's table. */
export interface ColumnValues {
	/** the boundary set that the values are of */
	boundarySet: string;
	/** in region order; null where the file says nothing */
	values: (string | null)[];
}
