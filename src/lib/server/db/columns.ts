import { char, customType, datetime, int, varchar } from 'drizzle-orm/mysql-core';

/** A moment in UTC, to the millisecond. */
export const at = (name: string) => datetime(name, { mode: 'date', fsp: 3 });
/** A generated row number. */
export const id = () => int('id').autoincrement().primaryKey();
/** A person's id (UUID). */
export const personId = (name: string) => varchar(name, { length: 36 });
/** The name by which addresses, directives and scripts call a row. */
export const slug = () => varchar('slug', { length: 80 }).notNull();
/** Raised by one on every edit; an edit names the version it saw. */
export const version = () => int('version').notNull().default(1);
/** ISO 4217 code that goes with an amount in minor units. */
export const currency = (name = 'currency') => char(name, { length: 3 });
/** A SHA-256 in hex. */
export const sha256 = (name: string) => char(name, { length: 64 });

/** MEDIUMTEXT, for sources and pages. */
export const mediumtext = customType<{ data: string }>({ dataType: () => 'mediumtext' });
