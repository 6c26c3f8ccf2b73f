/** What the words on a sheet's collar are written in; BCP 47. */
export const sheetLanguage = 'en';
