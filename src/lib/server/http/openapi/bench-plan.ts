import type { Described } from '../openapi';

export const benchPlan: Described[] = [];
