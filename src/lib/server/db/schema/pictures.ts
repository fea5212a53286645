import { index, int, mysqlEnum, mysqlTable, primaryKey, uniqueIndex, varchar } from 'drizzle-orm/mysql-core';
import { at, personId, sha256 } from '../columns';
import { edition } from './articles';
import { user } from './people';

/** A picture, stored once by the hash of its file; the files themselves are in the data folder. */
export const picture = mysqlTable(
	'picture',
	{
		/** Of the file kept: turned upright, scaled, without position data. It is the picture's address. */
		sha256: sha256('sha256').primaryKey(),
		/** Of the file as it was sent, by which the same file is known again without decoding it. */
		uploadSha256: sha256('upload_sha256').notNull(),
		width: int('width').notNull(),
		height: int('height').notNull(),
		mime: varchar('mime', { length: 40 }).notNull(),
		bytes: int('bytes').notNull(),
		/** For what shows no WebP. */
		fallback: mysqlEnum('fallback', ['jpg', 'png']).notNull(),
		/** The text for those who cannot see it, offered where it is used again. */
		alt: varchar('alt', { length: 500 }).notNull().default(''),
		credit: varchar('credit', { length: 200 }).notNull().default(''),
		/** What its file was called when it came. */
		fileName: varchar('file_name', { length: 200 }).notNull().default(''),
		storedBy: personId('stored_by')
			.notNull()
			.references(() => user.id),
		storedAt: at('stored_at').notNull()
	},
	(t) => [uniqueIndex('picture_upload').on(t.uploadSha256), index('picture_stored').on(t.storedAt)]
);

/** Which pictures an edition shows: those of live editions are the ones readers may have. */
export const editionPicture = mysqlTable(
	'edition_picture',
	{
		editionId: int('edition_id')
			.notNull()
			.references(() => edition.id),
		sha256: sha256('sha256')
			.notNull()
			.references(() => picture.sha256)
	},
	(t) => [primaryKey({ columns: [t.editionId, t.sha256] }), index('edition_picture_picture').on(t.sha256)]
);
