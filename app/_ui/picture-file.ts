/** Pictures of a page as files of their own. Browser only. */

/** Properties that a picture takes from the page's style sheet. */
const STYLES = [
  "fill",
  "fill-opacity",
  "stroke",
  "stroke-width",
  "stroke-dasharray",
  "stroke-linecap",
  "stroke-linejoin",
  "font-family",
  "font-size",
  "font-style",
  "font-weight",
  "text-anchor",
  "opacity",
  "color",
] as const;

/** The picture as an SVG file that stands alone: light colours, on paper, styles written out. */
export function svgFile(picture: SVGSVGElement): string {
  const copy = picture.cloneNode(true) as SVGSVGElement;
  copy.querySelectorAll("[data-cursor]").forEach((element) => element.remove());
  const { width, height } = picture.viewBox.baseVal;
  const stage = document.createElement("div");
  // Styles are read inside the page, where the tokens are, and always in light colours.
  stage.dataset.theme = "light";
  stage.style.cssText = "position:absolute;left:-100000px;top:0;color:var(--ink)";
  stage.append(copy);
  document.body.append(stage);
  try {
    for (const element of [copy, ...copy.querySelectorAll<SVGElement>("*")]) {
      const computed = getComputedStyle(element);
      const styles = STYLES.map((name) => `${name}:${computed.getPropertyValue(name)}`);
      element.removeAttribute("class");
      element.setAttribute("style", styles.join(";").replaceAll('"', "'"));
    }
    for (const name of ["role", "tabindex", "aria-orientation", "aria-valuemin", "aria-valuemax"]) {
      copy.removeAttribute(name);
    }
    copy.removeAttribute("aria-valuenow");
    copy.removeAttribute("aria-valuetext");
    copy.setAttribute("xmlns", "http://www.w3.org/2000/svg");
    copy.setAttribute("width", String(width));
    copy.setAttribute("height", String(height));
    return new XMLSerializer().serializeToString(copy);
  } finally {
    stage.remove();
  }
}

/** The same as a PNG on white, at twice the size on screen. */
export async function pngFile(picture: SVGSVGElement): Promise<Blob> {
  const { width, height } = picture.viewBox.baseVal;
  return pngOfSvg(svgFile(picture), width, height);
}

/** The text of an SVG that stands alone as a PNG on white, at twice its size in pixels. */
export async function pngOfSvg(text: string, width: number, height: number): Promise<Blob> {
  const url = URL.createObjectURL(new Blob([text], { type: "image/svg+xml" }));
  try {
    const image = new Image();
    image.src = url;
    await image.decode();
    const canvas = document.createElement("canvas");
    canvas.width = Math.round(width * 2);
    canvas.height = Math.round(height * 2);
    const paper = canvas.getContext("2d");
    if (!paper) throw new Error("This browser cannot draw the picture.");
    paper.fillStyle = "#ffffff";
    paper.fillRect(0, 0, canvas.width, canvas.height);
    paper.drawImage(image, 0, 0, canvas.width, canvas.height);
    return await new Promise((resolve, reject) =>
      canvas.toBlob(
        (blob) => (blob ? resolve(blob) : reject(new Error("No picture came about."))),
        "image/png",
      ),
    );
  } finally {
    URL.revokeObjectURL(url);
  }
}

/** Hands a file to the reader's downloads. */
export function saveFile(name: string, content: string | Blob, type: string): void {
  const blob = typeof content === "string" ? new Blob([content], { type }) : content;
  const url = URL.createObjectURL(blob);
  const anchor = document.createElement("a");
  anchor.href = url;
  anchor.download = name;
  anchor.click();
  setTimeout(() => URL.revokeObjectURL(url), 1000);
}
