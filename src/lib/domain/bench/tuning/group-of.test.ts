import { expect, it } from 'vitest';
import { groupOf } from './group-of';

it.each([
	['Core group 2 ratio', '', 2],
	['CHIPLET #1 RATIO', '', 1],
	['Ratio', 'Chiplet 1 > Cluster 12', 12],
	['Group 3 ratio', 'Chiplet 1', 3],
	['Core 3 ratio', '', null],
	['Group ratio', 'Slot 2', null]
])('the group of %j under %j', (setting, menuPath, group) => {
	expect(groupOf({ setting, menuPath })).toBe(group);
});
