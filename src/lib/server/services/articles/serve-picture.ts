import type { Readable } from 'node:stream';
import { servedWidth } from '../../../domain/articles/pictures/picture';
import { may } from '../../../domain/people/policy';
import { done, refuse, type Outcome } from '../../../domain/shared/outcome';
import type { OpenContext } from '../../context';
import * as pictures from '../../db/queries/picture';
import { files } from '../../files/files';
import { pictureKey } from '../../files/picture-key';

export interface ServedPicture {
	etag: string;
	type: string;
	bytes: number;
	stream: () => Readable;
	/** Whether anybody may have it; otherwise it is kept from every shared cache. */
	isPublic: boolean;
}

const types = { webp: 'image/webp', jpg: 'image/jpeg', png: 'image/png' } as const;
const none = () => refuse('not_found', 'There is no such picture.');

/**
 * A stored picture's file: to anybody where a page that readers have shows it, to the desk where none does. To everyone
 * else it is as if it were not there, so that an address says nothing of a draft.
 */
export async function servePicture(
	ctx: OpenContext,
	{ file, width }: { file: string; width: number | null }
): Promise<Outcome<ServedPicture, 'not_found'>> {
	const [, sha256 = '', kind = ''] = /^([0-9a-f]{64})\.(webp|jpg|png)$/.exec(file) ?? [];
	if (kind !== 'webp' && kind !== 'jpg' && kind !== 'png') return none();
	const [found] = await pictures.factsOf(ctx.db, [sha256]);
	if (!found || (kind !== 'webp' && kind !== found.fallback)) return none();
	const isPublic = await pictures.isPublished(ctx.db, sha256);
	if (!isPublic && !may(ctx.actor, 'article.read')) return none();
	const served = servedWidth(found.width, width);
	const part = kind !== 'webp' ? 'fallback' : served === found.width ? 'whole' : served;
	const kept = await files().find(pictureKey(sha256, part));
	if (!kept) return none();
	return done({ ...kept, etag: `"${sha256}-${part}"`, type: types[kind], isPublic });
}
