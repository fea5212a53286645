/**
 * Takes everything around an element out of reach, so that neither Tab nor a screen reader goes where nothing is shown.
 * Returns what brings it back. What comes later, such as a dialog, can be reached.
 */
export function leaveAlone(element: HTMLElement): () => void {
	const hidden: HTMLElement[] = [];
	for (let inner: HTMLElement = element; inner.parentElement; inner = inner.parentElement) {
		for (const other of inner.parentElement.children) {
			if (!(other instanceof HTMLElement) || other === inner || other.inert || inner === document.body)
				continue;
			other.inert = true;
			hidden.push(other);
		}
	}
	return () => {
		for (const one of hidden) one.inert = false;
	};
}
