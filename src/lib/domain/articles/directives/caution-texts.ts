import type { RaiseTopic } from '../../bench/tuning/raises';
import type { CautionTopic } from './shape';

export interface CautionText {
	title: string;
	body: string;
}

/**
 * The usual cautions, in plain words. Where each comes from:
 * voltage, power, data: common practice, no source; that voltage and temperature shorten life is physics
 *   remembered (electromigration, Black's equation), and the limits are the maker's own.
 * heat: contact burns are the matter of ISO 13732-1 (remembered, not read).
 * liquid: leak-test before power, mains off: common practice, no source. What leaks near mains is for
 *   local electrical rules.
 * static: ANSI/ESD S20.20-2021 is about items that 100 V (human-body model) can damage; IEC 61340-5-1 is
 *   its international counterpart (remembered).
 * mains: never open a power supply, stored charge: common practice, no source.
 */
export const cautionTexts: Record<CautionTopic, CautionText> = {
	voltage: {
		title: 'Raising voltage',
		body: 'More voltage means more heat and a shorter life, and too much destroys a part at once. Stay inside the limits its maker gives for your part and your board, raise it in small steps, and stop when a step brings nothing. It may end your warranty.'
	},
	power: {
		title: 'Raising power limits',
		body: 'A higher limit draws more current through the board, its connectors and the power supply. Check that each is made for it, watch temperatures through the first hours, and keep to the limits their makers give. It may end your warranty.'
	},
	heat: {
		title: 'Heat',
		body: 'Heat sinks, regulators and plates stay hot enough to burn after the machine is off, and fans start without warning. Let it cool before you touch it. Check that your own cooler holds the temperature the maker allows under your own load before you leave the machine alone.'
	},
	liquid: {
		title: 'Liquid near electricity',
		body: 'Test a loop for leaks with the mains unplugged and the parts without power, and dry everything before you switch on. If liquid has reached a power supply or anything on the mains, leave it unplugged and have a qualified person look at it.'
	},
	static: {
		title: 'Static charge',
		body: 'A charge too small to feel can damage a part. Unplug the machine, work on a surface and with a wrist strap made for it, and keep parts in their bags until you fit them.'
	},
	data: {
		title: 'Your data',
		body: 'A machine that runs past its ratings can write wrong data without a word. Back up first, change one thing at a time, and test for longer than you think you need before you trust it with work. No test proves that it will never fail.'
	},
	mains: {
		title: 'Mains',
		body: 'Never open a power supply: it holds a charge long after it is unplugged. Anything wired to the mains is for a qualified person, under the electrical rules of where you live.'
	}
};

/** The short form that stands beside a step. */
export const stepCautions: Record<RaiseTopic, string> = {
	voltage:
		'More voltage means more heat and a shorter life. The maker’s limit for your part stands above ours.',
	power:
		'Check that your board, connectors and power supply are made for it. The maker’s limits stand above ours.',
	heat: 'Check that your cooler holds it under your own load before you leave it alone. The maker’s limit stands above ours.'
};
