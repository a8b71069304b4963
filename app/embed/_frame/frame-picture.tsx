"use client";

import { useEffect, useState } from "react";
import type { FrameApi } from "./frame-api";
import type { FrameView } from "./frame-view";

interface PictureProps {
  readonly view: FrameView;
  readonly api: FrameApi;
  /** Of the field solution. */
  readonly path: string;
}

/** The field as the service draws it; loaded only where the widget shows it. Without one, the answer stands alone. */
export function FramePicture({ view, api, path }: PictureProps) {
  const [picture, setPicture] = useState<Picture | null>(null);
  useEffect(() => {
    const abort = new AbortController();
    api.text(`${path}/plot.svg`, abort.signal).then(
      (text) => setPicture(pictureOf(text)),
      () => setPicture(null),
    );
    return () => abort.abort();
  }, [api, path]);
  if (picture === null) return null;
  return (
    <figure className="mt-2 border-t border-rule pt-1">
      <figcaption className="text-table font-semibold">{view.words.fieldPicture}</figcaption>
      <svg
        viewBox={picture.viewBox}
        role="img"
        aria-label={view.words.fieldPicture}
        className="mx-auto mt-1 block w-full max-w-[32rem]"
      >
        {/* As an image: whatever is in it, it runs and loads nothing. */}
        <image href={picture.address} width="100%" height="100%" />
      </svg>
    </figure>
  );
}

interface Picture {
  readonly viewBox: string;
  readonly address: string;
}

function pictureOf(text: string): Picture | null {
  const viewBox = /\bviewBox="(0 0 [\d.]+ [\d.]+)"/.exec(text)?.[1];
  return viewBox === undefined
    ? null
    : { viewBox, address: `data:image/svg+xml,${encodeURIComponent(text)}` };
}
