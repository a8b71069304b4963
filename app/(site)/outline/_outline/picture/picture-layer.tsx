"use client";

import { memo, useId, useMemo } from "react";
import type { FieldMapView } from "../../_model/field-view";
import type { Ring } from "../../_model/sketch";
import { toScreen } from "../../_model/view";
import { conductorPath, type Lens, linePath } from "../board/paths";
import type { Shown } from "./shown";
import { rasterImage, topDensity } from "./raster-image";

interface PictureLayerProps {
  readonly map: FieldMapView;
  readonly rings: readonly Ring[];
  readonly lens: Lens;
  readonly shown: Shown;
}

/** The field in the conductor: density as a shade, equipotentials as lines, stream lines dashed. */
export const PictureLayer = memo(function PictureLayer({ map, rings, lens, shown }: PictureLayerProps) {
  const clip = useId();
  const mask = useId();
  const { raster } = map;
  const image = useMemo(() => rasterImage(raster, topDensity(raster)), [raster]);
  const half = raster.cell / 2;
  const [left, bottom] = toScreen(lens.view, lens.size, [raster.origin[0] - half, raster.origin[1] - half]);
  const width = raster.columns * raster.cell * lens.view.scale;
  const height = raster.rows * raster.cell * lens.view.scale;
  const box = { x: left, y: bottom - height, width, height };
  const outline = conductorPath(lens, rings);
  return (
    <g pointerEvents="none" data-testid="picture">
      <clipPath id={clip}>
        <path d={outline} clipRule="evenodd" />
      </clipPath>
      <g clipPath={`url(#${clip})`}>
        {shown.density && image !== "" ? (
          <>
            <mask id={mask} maskUnits="userSpaceOnUse" {...box}>
              <image href={image} {...box} preserveAspectRatio="none" />
            </mask>
            <rect {...box} className="fill-sheet" />
            <rect {...box} mask={`url(#${mask})`} className="fill-copper" data-testid="density" />
          </>
        ) : null}
        {shown.equipotentials ? (
          <path
            d={map.equipotentials.flatMap(({ lines }) => lines.map((line) => linePath(lens, line))).join("")}
            fill="none"
            className="stroke-ink"
            strokeWidth="1"
            data-testid="equipotentials"
          />
        ) : null}
        {shown.streamlines ? (
          <path
            d={map.streamlines.map((line) => linePath(lens, line)).join("")}
            fill="none"
            className="stroke-verdigris"
            strokeWidth="1.2"
            strokeDasharray="6 3"
            data-testid="streamlines"
          />
        ) : null}
      </g>
    </g>
  );
});
