/** A key with what is held down beside it, as CodeMirror writes it: Mod-Shift-o, F8, Ctrl-Space. */
export type Keys = string;

/** A command and the key it has at first. */
export interface Keyed {
	id: string;
	words: string;
	keys: Keys;
}

/** Keys that were changed, by the id of their command. */
export type ChangedKeys = Readonly<Record<string, Keys>>;

const held = new Set([
	'Control',
	'Meta',
	'Alt',
	'Shift',
	'AltGraph',
	'CapsLock',
	'Dead',
	'Process',
	'Unidentified'
]);
/** What the browser, the editor or the rest of the application keep for themselves. */
const taken: Record<string, string> = {
	'Mod-k': 'the list of places and acts',
	'Mod-t': 'the browser',
	'Mod-n': 'the browser',
	'Mod-w': 'the browser',
	'Mod-r': 'the browser',
	'Mod-q': 'the browser',
	'Mod-Shift-t': 'the browser',
	'Mod-Shift-n': 'the browser',
	'Mod-Shift-w': 'the browser',
	'Mod-a': 'selecting all',
	'Mod-c': 'copying',
	'Mod-v': 'pasting',
	'Mod-Shift-v': 'pasting as plain text',
	'Mod-x': 'cutting'
};

type Pressed = Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey' | 'altKey' | 'shiftKey'>;

/** What was pressed; null while only keys that go with others are held. */
export function keysOf(
	{ key, ctrlKey, metaKey, altKey, shiftKey }: Pressed,
	hasCommand: boolean
): Keys | null {
	if (held.has(key)) return null;
	const letter = key === ' ' ? 'Space' : key.length === 1 ? key.toLowerCase() : key;
	// Shift is in a sign already, but not in a letter.
	const shift = shiftKey && (key.length > 1 || key.toLowerCase() !== key.toUpperCase() || key === ' ');
	const mod = hasCommand ? metaKey : ctrlKey;
	const parts = [mod && 'Mod', hasCommand && ctrlKey && 'Ctrl', altKey && 'Alt', shift && 'Shift', letter];
	return parts.filter((part) => part !== false).join('-');
}

/** A key as it stands on screen; Mod is left to KeyHint. @example shownKeys('Mod-Shift-o') === 'Mod Shift O' */
export const shownKeys = (keys: Keys): string =>
	keys
		.replace(/-(?=.)/g, ' ')
		.replace(/(^| )([a-z])$/, (_, before: string, letter: string) => before + letter.toUpperCase());

export const keyOf = (command: Keyed, changed: ChangedKeys): Keys => changed[command.id] ?? command.keys;

/** Why a command cannot have a key; null where it can. */
export function keyProblem(
	keys: Keys,
	id: string,
	commands: readonly Keyed[],
	changed: ChangedKeys
): string | null {
	if (!/^(?:Mod|Ctrl|Alt)-/.test(keys) && !/^(?:Shift-)?F\d{1,2}$/.test(keys))
		return 'This would be typed into the text. Hold Ctrl, ⌘ or Alt beside it, or take a key such as F8.';
	const owner = taken[keys];
	if (owner !== undefined) return `This key is kept for ${owner}. Choose another.`;
	const other = commands.find((command) => command.id !== id && keyOf(command, changed) === keys);
	return other ? `“${other.words}” has this key. Change that one first, or choose another.` : null;
}

const place = 'calipress:keys';

/** The keys that were changed in this browser. */
export function readKeys(): ChangedKeys {
	try {
		const kept: unknown = JSON.parse(localStorage.getItem(place) ?? '{}');
		if (typeof kept !== 'object' || kept === null) return {};
		return Object.fromEntries(
			Object.entries(kept).filter((entry): entry is [string, string] => typeof entry[1] === 'string')
		);
	} catch {
		return {};
	}
}

/** Keeps them; a browser that keeps nothing forgets them with the page. */
export function keepKeys(changed: ChangedKeys): void {
	try {
		localStorage.setItem(place, JSON.stringify(changed));
	} catch {
		return;
	}
}
