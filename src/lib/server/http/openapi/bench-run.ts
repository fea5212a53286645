import type { Described } from '../openapi';

export const benchRun: Described[] = [];
