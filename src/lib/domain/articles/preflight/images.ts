import type { Check } from './finding';

/** Every image is one of this site's and says in words what it shows. */
export const images: Check = ({ page }) =>
	page.errors
		.filter((error) => error.directive === 'image')
		.map(({ message, line }) => ({
			check: 'images',
			severity: 'blocking',
			message,
			mend: `The image is on line ${line}.`,
			place: { kind: 'line', line }
		}));
