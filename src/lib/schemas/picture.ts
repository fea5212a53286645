import { z } from 'zod';
import { altMaxLength } from '../domain/articles/pictures/picture';
import { line } from './fields';

const alt = line(altMaxLength);
const credit = line(200);

/** What is said of a picture when it is sent: in the address, because the body is the picture. */
export const pictureQuery = z.object({
	alt: alt.default('').describe('What it shows, for those who cannot see it.'),
	credit: credit.default('').describe('Whose picture it is, where that must be said.'),
	name: line(200).default('').describe('What its file is called.')
});

/** What is said of a picture that is here. */
export const pictureWords = z.object({ alt: alt.optional(), credit: credit.optional() });
export interface PictureWords {
	alt: string;
	credit: string;
}

/** The width a page asks for; what cannot be read asks for the whole picture. */
export const pictureWidth = z.coerce.number().int().min(1).max(20_000).nullable().catch(null);
