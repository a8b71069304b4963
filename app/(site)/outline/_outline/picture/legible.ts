/** As many lines as keep apart from each other: in a long narrow conductor twenty stream lines are one stripe. */
import type { FieldMapView } from "../../_model/field-view";

/** Shares of voltage and current that a map is first asked for. */
export const MOST_SHARES = 20;
/** Size of the board for which lines are counted, px; zoomed in they stay as few. */
const BOARD = { width: 600, height: 440 };
/** How near lines may come to each other on average, px. */
const LEAST_APART = 9;
const SHARES = [MOST_SHARES, 10, 5, 4, 2];

export interface LegibleShares {
  readonly voltage: number;
  readonly current: number;
}

/** Shares of voltage and current whose lines keep apart, from a map with the most of them. */
export function legibleShares(map: FieldMapView): LegibleShares {
  const { raster, equipotentials, streamlines } = map;
  const [width, height] = [raster.columns * raster.cell, raster.rows * raster.cell];
  const scale = Math.min(BOARD.width / width, BOARD.height / height);
  const cells = raster.density.reduce<number>((sum, value) => sum + Number(value !== null), 0);
  const area = cells * (raster.cell * scale) ** 2;
  const fit = (lines: readonly (readonly number[])[]): number => {
    const length = lengthOf(lines) * scale;
    return SHARES.find((shares) => area >= (LEAST_APART * length * shares) / MOST_SHARES) ?? 2;
  };
  return { voltage: fit(equipotentials.flatMap(({ lines }) => lines)), current: fit(streamlines) };
}

function lengthOf(lines: readonly (readonly number[])[]): number {
  let sum = 0;
  for (const line of lines) {
    for (let k = 2; k + 1 < line.length; k += 2) {
      sum += Math.hypot(line[k] - line[k - 2], line[k + 1] - line[k - 1]);
    }
  }
  return sum;
}
