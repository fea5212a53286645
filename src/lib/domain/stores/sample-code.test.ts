import { describe, expect, it } from 'vitest';
import { codeIn, samplesByCode } from './sample-code';

const samples = [
	{ slug: 'n-101', serial: 'AM16-004417' },
	{ slug: 'n-102', serial: '' },
	{ slug: 'n-103', serial: 'P6 7719' },
	{ slug: 'n-104', serial: 'n-102' }
];
const found = (text: string) => samplesByCode(text, samples).map((one) => one.slug);

describe('a code of a sample', () => {
	it.each([
		['https://lab.example/stores/samples/n-101', 'n-101'],
		['http://10.0.0.4:3000/stores/samples/N-101/', 'n-101'],
		['/stores/samples/n-101?x=1#y', 'n-101'],
		[' n-101 ', 'n-101'],
		['https://elsewhere.example/', 'https://elsewhere.example/']
	])('in “%s” is %s', (text, code) => expect(codeIn(text)).toBe(code));

	it('is a slug before it is a serial number', () => {
		expect(found('N-102')).toEqual(['n-102']);
		expect(found('am16-004417')).toEqual(['n-101']);
		expect(found('p67719')).toEqual(['n-103']);
	});

	it('never finds samples without a serial number by nothing', () => {
		expect(found('')).toEqual([]);
		expect(found('  ')).toEqual([]);
		expect(found('x')).toEqual([]);
	});
});
