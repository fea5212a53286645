/** How units are read aloud: one, and several (names of the SI Brochure, 9th edition, tables 2, 4, 5, 7 and 8; of bytes IEC 80000-13; the rest common practice, no source). */
const spoken: Record<string, readonly [one: string, several: string]> = {
	'%': ['percent', 'percent'],
	'°C': ['degree Celsius', 'degrees Celsius'],
	'°': ['degree', 'degrees'],
	K: ['kelvin', 'kelvins'],
	'K/W': ['kelvin per watt', 'kelvins per watt'],
	mW: ['milliwatt', 'milliwatts'],
	W: ['watt', 'watts'],
	kW: ['kilowatt', 'kilowatts'],
	Wh: ['watt-hour', 'watt-hours'],
	kWh: ['kilowatt-hour', 'kilowatt-hours'],
	J: ['joule', 'joules'],
	kJ: ['kilojoule', 'kilojoules'],
	mV: ['millivolt', 'millivolts'],
	V: ['volt', 'volts'],
	mA: ['milliamp', 'milliamps'],
	A: ['amp', 'amps'],
	Hz: ['hertz', 'hertz'],
	kHz: ['kilohertz', 'kilohertz'],
	MHz: ['megahertz', 'megahertz'],
	GHz: ['gigahertz', 'gigahertz'],
	'MT/s': ['megatransfer per second', 'megatransfers per second'],
	'GT/s': ['gigatransfer per second', 'gigatransfers per second'],
	kB: ['kilobyte', 'kilobytes'],
	MB: ['megabyte', 'megabytes'],
	GB: ['gigabyte', 'gigabytes'],
	TB: ['terabyte', 'terabytes'],
	KiB: ['kibibyte', 'kibibytes'],
	MiB: ['mebibyte', 'mebibytes'],
	GiB: ['gibibyte', 'gibibytes'],
	TiB: ['tebibyte', 'tebibytes'],
	'MB/s': ['megabyte per second', 'megabytes per second'],
	'GB/s': ['gigabyte per second', 'gigabytes per second'],
	'MiB/s': ['mebibyte per second', 'mebibytes per second'],
	'GiB/s': ['gibibyte per second', 'gibibytes per second'],
	ns: ['nanosecond', 'nanoseconds'],
	µs: ['microsecond', 'microseconds'],
	ms: ['millisecond', 'milliseconds'],
	s: ['second', 'seconds'],
	min: ['minute', 'minutes'],
	h: ['hour', 'hours'],
	'frames/s': ['frame per second', 'frames per second'],
	fps: ['frame per second', 'frames per second'],
	rpm: ['revolution per minute', 'revolutions per minute'],
	'r/min': ['revolution per minute', 'revolutions per minute'],
	dB: ['decibel', 'decibels'],
	'dB(A)': ['decibel, A-weighted', 'decibels, A-weighted'],
	mm: ['millimetre', 'millimetres'],
	'×': ['times', 'times'],
	pts: ['point', 'points'],
	points: ['point', 'points'],
	EUR: ['euro', 'euros'],
	USD: ['dollar', 'dollars'],
	GBP: ['pound', 'pounds']
};

/** Currency signs stand before their number and are read after it. */
export const moneySigns: Record<string, string> = { '€': 'EUR', $: 'USD', '£': 'GBP' };

/** Units that can be read, the longest first, so that K/W is not read as K. */
export const spokenUnits: readonly string[] = Object.keys(spoken).sort((a, b) => b.length - a.length);

/** A unit as it is read after a number; the unit itself where we know no words for it. @example sayUnit('W', '1') === 'watt' */
export function sayUnit(unit: string, number: string): string {
	const words = spoken[unit];
	if (!words) return unit;
	return /^[+\u2212-]?1$/.test(number) ? words[0] : words[1];
}
