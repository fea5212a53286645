import type { Described } from './openapi';
import { about } from './openapi/about';
import { benchLab } from './openapi/bench-lab';
import { benchPlan } from './openapi/bench-plan';
import { benchRun } from './openapi/bench-run';
import { benchStability } from './openapi/bench-stability';
import { desk } from './openapi/desk';

/** Every operation of /api/v1, one file per area; a test holds it against the route files. */
export const described: Described[] = [
	...about,
	...benchPlan,
	...benchLab,
	...benchRun,
	...benchStability,
	...desk
];
