// Both are our own markup, made by `plateFigure` and printed again by the comparison.
const drawn =
	/(<figure class="plate"[^>]* data-plate="([\w-]+)"[^>]*>(?:(?!<figure)[\s\S])*?<div class="plate-drawing">)([\s\S]*?)(<\/div><figcaption)/g;
const undrawn =
	/(<figure class="plate"[^>]* data-plate="([\w-]+)"[^>]*>(?:(?!<figure)[\s\S])*?<div class="plate-drawing">)(<\/div>)/g;

/** A page without the drawings of its plates, which are most of it and are not what is compared, and they by key. */
export function takeDrawings(page: string): { page: string; drawings: Map<string, string> } {
	const drawings = new Map<string, string>();
	const bare = page.replace(drawn, (_, lead: string, key: string, drawing: string, tail: string) => {
		drawings.set(key, drawing);
		return lead + tail;
	});
	return { page: bare, drawings };
}

/** Markup with the drawings of its plates in it again. @param drawing undefined leaves the place empty */
export const putDrawings = (html: string, drawing: (key: string) => string | undefined): string =>
	html.replace(undrawn, (_, lead: string, key: string, tail: string) => lead + (drawing(key) ?? '') + tail);
