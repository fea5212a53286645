/** What a key does in a field of the entry grid. */
export type GridAct =
	'next' | 'up' | 'down' | 'fill' | 'undo' | 'keys' | 'cell-up' | 'cell-down' | 'cell-left' | 'cell-right';

const arrows: Record<string, 'up' | 'down' | 'left' | 'right'> = {
	ArrowUp: 'up',
	ArrowDown: 'down',
	ArrowLeft: 'left',
	ArrowRight: 'right'
};

type Key = Pick<KeyboardEvent, 'key' | 'altKey' | 'ctrlKey' | 'metaKey' | 'shiftKey'>;

/**
 * The act a key stands for; null for one that the field takes itself.
 * @param empty whether nothing is typed in the field: then there is nothing of its own to undo
 */
export function gridKey(event: Key, empty: boolean): GridAct | null {
	const mod = event.ctrlKey || event.metaKey;
	const arrow = arrows[event.key];
	if (arrow && !event.shiftKey && (event.altKey || event.ctrlKey)) return `cell-${arrow}`;
	if (mod && !event.altKey && !event.shiftKey) {
		const key = event.key.toLowerCase();
		if (key === 'd') return 'fill';
		return key === 'z' && empty ? 'undo' : null;
	}
	if (event.altKey || mod) return null;
	if (event.key === '?') return 'keys';
	if (event.key === 'Enter') return 'next';
	return arrow === 'up' || arrow === 'down' ? arrow : null;
}
