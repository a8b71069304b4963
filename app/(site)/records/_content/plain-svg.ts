/**
 * The picture of a field solution without rules of its own: in a page they would reach every other text, and on paper
 * they are not read. What they say becomes attributes.
 */
export function plainSvg(svg: string, clipId: string): string {
  return svg
    .replace(/<title[^>]*>.*?<\/title>|<desc[^>]*>.*?<\/desc>|<style>.*?<\/style>/gs, "")
    .replace(/ role="img" aria-labelledby="[^"]*"/, ` font-family="sans-serif" font-size="14"`)
    .replaceAll('id="c"', `id="${clipId}"`)
    .replaceAll("url(#c)", `url(#${clipId})`)
    .replace(/<text\b([^>]*)>/g, (_, attributes: string) => `<text${textAttributes(attributes)}>`);
}

function textAttributes(attributes: string): string {
  const colour = /style="fill:([^"]+)"/.exec(attributes)?.[1];
  const kind = /class="([^"]+)"/.exec(attributes)?.[1];
  const kept = attributes.replace(/ (?:style|class)="[^"]*"/g, "");
  const size = kind === "title" ? ` font-size="22"` : "";
  const weight = kind === "title" || kind === "name" ? ` font-weight="600"` : "";
  const halo = kind === "name" ? ` stroke="#faf8f3" stroke-width="5" paint-order="stroke"` : "";
  const fill = colour ?? (kind === "soft" ? "#566067" : "#1b2226");
  return `${kept}${size}${weight}${halo} fill="${fill}"`;
}
