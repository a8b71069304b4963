/** How numbers and texts are written into a picture. */

/** A coordinate, to hundredths of a pixel. */
export function px(value: number): string {
  return String(Math.round(value * 100) / 100);
}

export function escapeText(text: string): string {
  return text.replace(/[&<>"']/g, (c) => `&#${c.charCodeAt(0)};`);
}
