import type { Check } from './finding';

/** Every directive finds what it names, and every link leads somewhere. Images have a check of their own. */
export const directives: Check = ({ page }) =>
	page.errors
		.filter((error) => error.directive !== 'image')
		.map(({ message, nearest, line }) => ({
			check: 'directives',
			severity: 'blocking',
			message,
			mend:
				nearest.length > 0
					? `Line ${line}. Perhaps you mean ${nearest.join(' or ')}.`
					: `Mend line ${line}, or take it out.`,
			place: { kind: 'line', line }
		}));
