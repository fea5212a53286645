import { describe, expect, it } from 'vitest';
import { unitFault } from './unit-fault';

const render = { slug: 'tile-render', unit: 's' };
const search = { slug: 'prime-search', unit: 'events/s' };

describe('a unit that is not the workload’s', () => {
	it('is none where it is the same, whichever letter mu it has', () => {
		expect(unitFault(' s ', render)).toBeNull();
		expect(unitFault('\u00b5s', { slug: 'latency', unit: '\u03bcs' })).toBeNull();
		expect(unitFault('events/s', search)).toBeNull();
	});

	it('of the same kind can be converted', () => {
		expect(unitFault('ms', render)).toBe(
			'tile-render is measured in s. ms is the same kind: convert the readings and send them in s.'
		);
	});

	it('of another kind is told with both kinds', () => {
		expect(unitFault('W', render)).toContain('W is a power, but tile-render is measured in s, a time.');
		expect(unitFault('ms', search)).toContain('ms is a time, but prime-search is measured in events/s.');
	});

	it('that nobody knows gets the nearest', () => {
		expect(unitFault('parsec', render)).toMatch(/^“parsec” is no unit Calipress knows\. .* in s\./);
		expect(unitFault('event/s', search)).toContain('Did you mean events/s');
		expect(unitFault('', render)).toContain('missing');
		expect(unitFault('x'.repeat(500), render)?.length).toBeLessThan(200);
	});
});
