import type { Stage } from '../../domain/articles/stage';
import type { MarkKind } from './marks';

/** Which mark a stage of an article has. */
export const stageMarks: Record<Stage, MarkKind> = {
	drafting: 'draft',
	'in-review': 'info',
	'changes-asked': 'error',
	approved: 'passed',
	scheduled: 'waiting',
	published: 'live',
	withdrawn: 'void'
};
