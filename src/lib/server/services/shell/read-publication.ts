import type { OpenContext } from '../../context';
import { publication, type Publication } from '../../db/queries/settings';

/** The publication's name, zone and tagline, for the pages of those who are not signed in. */
export const readPublication = ({ db }: OpenContext): Promise<Publication> => publication(db);
