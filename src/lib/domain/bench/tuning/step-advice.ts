import { practice, type Advice } from './advice';
import { short } from './figures';
import { memoryClockMHz, synchronous } from './memory';
import { valuesOf, type GroupedSetting } from './setting-values';

/**
 * Whether memory controller and fabric run in step with the memory: at its clock, or the controller at a whole part of
 * it. Says nothing where one of them is not set, or set in several places.
 */
export function stepAdvice(settings: readonly GroupedSetting[]): Advice[] {
	const [rate, ...moreRates] = valuesOf(settings, 'memory-data-rate');
	if (!rate || moreRates.length > 0) return [];
	const memory = memoryClockMHz(rate.value);
	const against = (quantity: 'memory-controller-clock' | 'fabric-clock'): Advice[] => {
		const [clock, ...more] = valuesOf(settings, quantity);
		if (!clock || more.length > 0 || synchronous(clock.value, memory)) return [];
		const isController = quantity === 'memory-controller-clock';
		const halved = isController && synchronous(clock.value * 2, memory);
		const who = isController ? 'memory controller' : 'fabric';
		const runs = `The ${who} runs at ${short(clock.value)} MHz and the memory at ${short(memory)} MHz`;
		return [
			{
				kind: isController ? 'controller-not-in-step' : 'fabric-not-in-step',
				severity: 'advice',
				words: halved
					? `${runs}, half its clock. That is a step of its own, and latency is usually longer than at the same clock.`
					: `${runs}, so they are not in step. What passes between them usually waits longer than it would in step; measure both.`,
				settings: [clock.fact.setting, rate.fact.setting],
				source: practice
			}
		];
	};
	return [...against('memory-controller-clock'), ...against('fabric-clock')];
}
