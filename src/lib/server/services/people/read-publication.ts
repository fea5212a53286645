import { done, type Outcome } from '../../../domain/shared/outcome';
import type { OpenContext } from '../../context';
import * as settings from '../../db/queries/settings';

/** The publication's name, zone and tagline, which everybody may know. */
export const readPublication = async (ctx: OpenContext): Promise<Outcome<settings.Publication, never>> =>
	done(await settings.publication(ctx.db));
