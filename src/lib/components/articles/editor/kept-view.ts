/** How somebody likes the editor in this browser. */
export interface KeptView {
	outline: boolean;
	alone: 'source' | 'page' | null;
}

const place = 'calipress:editor-view';

export function readView(): KeptView {
	try {
		const kept = JSON.parse(localStorage.getItem(place) ?? '{}') as Partial<KeptView> | null;
		const alone = kept?.alone === 'source' || kept?.alone === 'page' ? kept.alone : null;
		return { outline: kept?.outline === true, alone };
	} catch {
		return { outline: false, alone: null };
	}
}

/** Keeps it; a browser that keeps nothing forgets it with the page. */
export function keepView(view: KeptView): void {
	try {
		localStorage.setItem(place, JSON.stringify(view));
	} catch {
		return;
	}
}
