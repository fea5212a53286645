import { describe, expect, it } from 'vitest';
import { attemptBlock } from './attempt-block';

const given = {
	stresses: [
		{ slug: 'long-sums', name: 'Long sums' },
		{ slug: 'tile-render', name: 'Tile render' }
	],
	stress: 'long-sums'
};
const rows = (text: string) => {
	const block = attemptBlock(text, given);
	return block.ok ? block.rows : block.message;
};

// The block a spreadsheet puts on the clipboard: tabs and CR LF (common practice, no source).
describe('a pasted block of attempts', () => {
	it('takes columns in their order, names for slugs, and the words of other sheets', () => {
		expect(rows('4900\t1,25\tTile Render\t20\tFail\tcrash\t2\t71\t180,5\r\n')).toEqual([
			{
				clockMHz: '4900',
				volts: '1,25',
				stress: 'tile-render',
				durationMin: '20',
				outcome: 'failed',
				failure: 'crash',
				errors: '2',
				peakTempC: '71',
				packageW: '180,5'
			}
		]);
	});

	it('leaves headings and empty lines out, and fills in what a short line does not say', () => {
		expect(rows('Clock\tVolts\tStress\tMinutes\n4800\t1.2\t\t30\n\n4825\t1.2\n')).toMatchObject([
			{ clockMHz: '4800', stress: 'long-sums', outcome: 'passed', failure: '' },
			{ clockMHz: '4825', durationMin: '', outcome: 'passed' }
		]);
	});

	it('judges nothing: what it does not know stays to be mended', () => {
		expect(rows('fast\t1.2\tOther sums\t30\tperhaps')).toMatchObject([
			{ clockMHz: 'fast', stress: 'Other sums', outcome: 'perhaps' }
		]);
	});

	it('says that there is nothing', () => {
		expect(rows(' \n')).toContain('nothing');
		expect(rows('Clock\tVolts')).toContain('nothing');
	});
});
