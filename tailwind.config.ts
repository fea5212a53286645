import typography from '@tailwindcss/typography';
import type { Config } from 'tailwindcss';

// Colours, type and spacing live in src/app.css as @theme tokens; this file holds what only a config can say.
export default {
	content: ['./src/**/*.{html,js,ts,svelte,svx}'],
	darkMode: ['selector', '[data-theme="dark"]'],
	plugins: [typography]
} satisfies Config;
