import { z } from 'zod';
import { pictureLimitBytes } from '../../../domain/articles/pictures/picture';
import { pictureQuery, pictureWords } from '../../../schemas/picture';
import { describe } from '../openapi';

const picture = z.object({
	sha256: z.string().describe('Of the file that is kept.'),
	address: z.string().describe('What to write in Markdown: ![alt](address "caption").'),
	width: z.number(),
	height: z.number(),
	fallback: z
		.enum(['jpg', 'png'])
		.describe('What there is besides WebP, under the same address with this ending.'),
	bytes: z.number(),
	alt: z.string(),
	credit: z.string(),
	known: z.boolean().describe('Whether it was here already.'),
	notes: z.array(z.string()).describe('What of the file sent is not in the picture.')
});

/** Pictures for articles. */
export const desk = [
	describe({
		method: 'post',
		path: '/api/v1/pictures',
		act: 'picture.store',
		summary: `Send a picture as the body, up to ${pictureLimitBytes / 1e6} MB: JPEG, PNG, WebP, AVIF, GIF or TIFF. It is kept upright, at most 2,560 px long, without the place it was taken at, and once however often it is sent`,
		query: pictureQuery,
		upload: ['image/jpeg', 'image/png', 'image/webp', 'image/avif', 'image/gif', 'image/tiff'],
		response: picture,
		status: 201
	}),
	describe({
		method: 'patch',
		path: '/api/v1/pictures/{picture}',
		act: 'picture.store',
		summary: 'Say what a picture shows and whose it is; it is named by its hash',
		body: pictureWords,
		response: picture
	})
];
