/** Prints the page once what was just asked for is drawn. */
export function printSoon(): void {
  requestAnimationFrame(() => requestAnimationFrame(() => window.print()));
}
