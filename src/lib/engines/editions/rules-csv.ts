/** The rules of a draft as a table, out and in again. */
export { rulesColumns, rulesToCsv } from './rules-csv-write.ts';
export { rulesFromCsv, type RowFault, type RulesRead } from './rules-csv-read.ts';
export type { RulesCsvGround } from './rules-csv-cells.ts';
export { addRules, noRules, replaceRules, type RuleParts } from './rule-parts.ts';
