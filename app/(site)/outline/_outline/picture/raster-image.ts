/** The density as an image whose opacity is the value: the page's colour shines through it, light or dark. */
import type { RasterView } from "../../_model/field-view";

/** Densities above this share of the cells are one shade: a corner would swallow the scale. */
const TOP_SHARE = 0.985;
export const MOST_OPACITY = 0.85;

/** The density at which the shade is full. */
export function topDensity({ density }: RasterView): number {
  const inside = density.filter((value): value is number => value !== null).sort((a, b) => a - b);
  return inside[Math.min(inside.length - 1, Math.floor(inside.length * TOP_SHARE))] ?? 0;
}

/** Data URL of a picture in white, one pixel a cell, the upper row first. Browser only. */
export function rasterImage(raster: RasterView, top: number): string {
  const { columns, rows } = raster;
  const canvas = document.createElement("canvas");
  canvas.width = columns;
  canvas.height = rows;
  const paper = canvas.getContext("2d");
  if (!paper || !(top > 0)) return "";
  const image = paper.createImageData(columns, rows);
  const values = grown(raster);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const value = values[row * columns + column];
      const at = 4 * ((rows - 1 - row) * columns + column);
      image.data.fill(255, at, at + 3);
      image.data[at + 3] = value === null ? 0 : Math.round(255 * MOST_OPACITY * Math.min(1, value / top));
    }
  }
  paper.putImageData(image, 0, 0);
  return canvas.toDataURL("image/png");
}

/** Cells just outside take the mean of their neighbours, so that the shade reaches the outline, which cuts it off. */
function grown({ columns, rows, density }: RasterView): readonly (number | null)[] {
  let values = density;
  for (let round = 0; round < 2; round++) {
    const before = values;
    values = before.map((value, k) => {
      if (value !== null) return value;
      const [row, column] = [Math.floor(k / columns), k % columns];
      let [sum, count] = [0, 0];
      for (let dy = -1; dy <= 1; dy++) {
        for (let dx = -1; dx <= 1; dx++) {
          const [y, x] = [row + dy, column + dx];
          const near = y < 0 || x < 0 || y >= rows || x >= columns ? null : before[y * columns + x];
          if (near !== null) [sum, count] = [sum + near, count + 1];
        }
      }
      return count > 0 ? sum / count : null;
    });
  }
  return values;
}
