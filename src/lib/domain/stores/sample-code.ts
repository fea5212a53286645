interface Coded {
	slug: string;
	serial: string;
}

const plain = (text: string): string => text.toLowerCase().replace(/\s+/g, '');

/**
 * The code in what was typed or scanned: of the address on a label the sample's slug, whichever host it names;
 * anything else as it is.
 * @example codeIn('https://lab.example/stores/samples/n-101') // 'n-101'
 */
export function codeIn(text: string): string {
	const typed = text.trim();
	return /\/stores\/samples\/([a-z0-9-]+)\/?(?:[?#].*)?$/i.exec(typed)?.[1]?.toLowerCase() ?? typed;
}

/** The samples that a code names: the one with that slug, or else those with that serial number, spaces and case aside. */
export function samplesByCode<T extends Coded>(text: string, samples: readonly T[]): T[] {
	const code = plain(codeIn(text));
	if (code === '') return [];
	const own = samples.filter((one) => one.slug === code);
	return own.length > 0 ? own : samples.filter((one) => plain(one.serial) === code);
}
