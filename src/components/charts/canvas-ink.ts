/**
 * Colours and type of a canvas, read from the CSS variables at the place where it stands. Nothing is copied: a change of theme needs only
 * a redraw.
 */
const styles = new WeakMap<HTMLCanvasElement, CSSStyleDeclaration>();

/** Value of a variable ("--ink") at the canvas. */
export function inkOf(canvas: HTMLCanvasElement, variable: string): string {
  let style = styles.get(canvas);
  if (!style) {
    style = getComputedStyle(canvas);
    styles.set(canvas, style);
  }
  return style.getPropertyValue(variable).trim();
}

/** The font of chart text: 13 px at every size of the canvas. */
export const chartFont = { family: '"Sofia Sans", "Ebbmark Signs", system-ui, sans-serif', size: 13 } as const;
export const fontOf = (weight: 400 | 600): string => `${weight} ${chartFont.size}px ${chartFont.family}`;

/** Calls `redraw` whenever the canvas would look otherwise: theme chosen or followed, fonts arrived, paper instead of screen. */
export function onInkChange(redraw: () => void): () => void {
  const observer = new MutationObserver(redraw);
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ["data-theme"] });
  const queries = ["(prefers-color-scheme: dark)", "print"].map((query) => window.matchMedia(query));
  for (const query of queries) query.addEventListener("change", redraw);
  let watching = true;
  void document.fonts.ready.then(() => watching && redraw());
  return () => {
    watching = false;
    observer.disconnect();
    for (const query of queries) query.removeEventListener("change", redraw);
  };
}

export const onPaper = (): boolean => window.matchMedia("print").matches;

/** Words with a halo of the ground around them, so that a line behind stays clear of the letters. */
export function drawWords(
  context: CanvasRenderingContext2D,
  words: string,
  at: { x: number; y: number },
  ink: { colour: string; ground: string },
): void {
  context.lineJoin = "round";
  context.lineWidth = 3.5;
  context.strokeStyle = ink.ground;
  context.strokeText(words, at.x, at.y);
  context.fillStyle = ink.colour;
  context.fillText(words, at.x, at.y);
}
