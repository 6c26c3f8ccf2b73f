/** Design Tokens files (Format Module 2025.10) to inks. */
export { readDesignTokens, type TokensRead } from './read.ts';
export { tokenLimits } from './limits.ts';
