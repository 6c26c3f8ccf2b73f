/** The kinds of eyesight a sheet is checked for; `grey` is grey print read by anybody. */
export const readers = ['typical', 'protan', 'deutan', 'tritan', 'grey'] as const;
export type Reader = (typeof readers)[number];
