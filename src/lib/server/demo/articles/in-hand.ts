import type { World } from '../act';
import { loopFans } from '../campaigns/cooling';
import { powerLimits } from '../campaigns/graphics';
import { memoryRates } from '../campaigns/memory';
import { fourWays, newFirmware } from '../campaigns/processor';
import { prose, Story } from './story';

const scheduled = (world: World) =>
	new Story(world, {
		title: 'Brisk 360: quiet at what price',
		standfirst: 'Its fans can be held low for good. The render does not notice, and you will.',
		template: 'product-test',
		campaigns: [loopFans.slug],
		author: 'Noor'
	})
		.start(-14, '10:00')
		.save([-13, '15:10'], prose('quiet').split('\n## At full speed')[0] ?? '')
		.save([-8, '16:45'], prose('quiet'), 'with full speed, the steps and the table')
		.submit(-7, '09:00')
		.comment([-6, '10:20'], {
			name: 'quiet/half an hour',
			who: 'Marit',
			quote: 'ran the heaviest loop we have for half an hour, and waited for the clock to fall',
			body: 'Was half an hour enough for the water to get as warm as it gets?',
			blocking: true
		})
		.comment([-6, '14:00'], {
			name: 'quiet/half an hour, answered',
			who: 'Tomas',
			body: 'It stops rising after eighteen minutes; the log of each run shows it.',
			answers: 'quiet/half an hour'
		})
		.resolve([-6, '15:30'], 'Marit', 'quiet/half an hour')
		.approve(-3, '11:00')
		.schedule([-2, '12:00'], [2, '16:00']);

const underEmbargo = (world: World) =>
	new Story(world, {
		title: 'Marlow G70 at three power limits',
		standfirst: 'The first forty watts cost nothing. The next forty are free only with a lower voltage.',
		template: 'comparison',
		campaigns: [powerLimits.slug],
		author: 'Ines'
	})
		.start(-7, '13:00')
		.save([-5, '17:00'], prose('power-limits'))
		.submit(-4, '09:30')
		.comment([-3, '10:00'], {
			name: 'g70/meter',
			who: 'Tomas',
			quote: 'the meter is the card’s, and we have not held it against one of ours',
			body: 'Right to say it. I can do so when ours is back.'
		})
		.approve(-1, '15:00');

const inReview = (world: World) =>
	new Story(world, {
		title: 'Memory by hand: what an evening brings',
		standfirst: 'Three timings are worth turning. The rest of the evening goes into testing them.',
		template: 'tuning-guide',
		campaigns: [memoryRates.slug],
		author: 'Noor'
	})
		.start(-9, '14:00')
		.save([-6, '16:30'], prose('by-hand').split('\n## Is it stable?')[0] ?? '')
		.save([-4, '12:20'], prose('by-hand'), 'with a part on stability')
		.plan([-3, '09:00'], [5, '09:00'])
		.submit(-2, '09:10')
		.comment([-2, '15:00'], {
			name: 'hand/modules',
			who: 'Marit',
			quote: 'Everybody’s modules are fine at that voltage for years.',
			body: 'We do not know that, and it is the sentence somebody will act on. Take it out, or say what we know.',
			blocking: true
		})
		.comment([-2, '15:05'], {
			name: 'hand/two nights',
			who: 'Marit',
			quote: 'Do the same, and keep a backup from before you began.',
			body: 'Could this stand before the steps as well? Some will stop reading at the card.'
		})
		.comment([-1, '09:30'], {
			name: 'hand/row cycle',
			who: 'Pelle',
			quote: 'It is also the one that fails last and worst',
			body: 'It failed in the second night, not in the first, at eight clocks less than we print. Worth saying.'
		})
		.comment([-1, '10:15'], {
			name: 'hand/modules, answered',
			who: 'Noor',
			body: 'Agreed. I am asking Pelle what the modules’ temperature was, and will write that instead.',
			answers: 'hand/modules'
		})
		.comment([-1, '11:00'], {
			name: 'hand/title',
			who: 'Ines',
			body: 'The title is good. Keep it.'
		})
		.resolve([-1, '11:30'], 'Noor', 'hand/title');

const changesAsked = (world: World) =>
	new Story(world, {
		title: 'Automatic boost, and nothing else',
		standfirst: 'Two limits, five minutes, and no voltage to test.',
		template: 'short-note',
		campaigns: [fourWays.slug],
		author: 'Ines'
	})
		.start(-9, '16:00')
		.save([-6, '09:50'], prose('boost-alone'))
		.submit(-3, '17:10')
		.askChanges(
			[-1, '14:10'],
			'It says that the processor draws more and does not say how much. Either we measure it and print it, or the sentence about the small tower goes: we did not run one. The rest is ready.'
		);

const drafting = (world: World) =>
	new Story(world, {
		title: 'Firmware 2.20: do the verdicts stand?',
		standfirst: '',
		template: 'short-note',
		campaigns: [newFirmware.slug],
		author: 'Ines'
	})
		.start(-3, '10:30')
		.save([-1, '16:40'], prose('firmware'))
		.plan([-1, '17:00'], [8, '09:00']);

/** What the desk has in hand, one article at each stage before print. */
export const articlesInHand = (world: World) =>
	[scheduled, underEmbargo, changesAsked, inReview, drafting].flatMap((story) => story(world).acts);
