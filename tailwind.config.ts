import type { Config } from 'tailwindcss';

/** Only what cannot be said in src/app.css, where the booth's tokens live. */
export default { content: ['./src/**/*.{html,svelte,ts}'] } satisfies Config;
