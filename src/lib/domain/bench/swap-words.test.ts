import { expect, it } from 'vitest';
import { swapWords } from './swap-words';

const unit = (slug: string, kind: string) => ({ slug, kind, maker: 'Brisk', model: 'Tower 14' });
const kit = [unit('m-201', 'processor'), unit('m-204', 'cooler')];

it('names what went and what came, kind by kind', () => {
	expect(
		swapWords(kit, [unit('m-201', 'processor'), unit('m-207', 'cooler'), unit('m-208', 'power-supply')])
	).toEqual([
		'cooler: m-204 (Brisk Tower 14) out, m-207 (Brisk Tower 14) in',
		'power supply: m-208 (Brisk Tower 14) in'
	]);
});

it('says nothing where only the order differs', () => {
	expect(swapWords(kit, kit.toReversed())).toEqual([]);
});
