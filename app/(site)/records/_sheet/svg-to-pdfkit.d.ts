declare module "svg-to-pdfkit" {
  interface Options {
    readonly width?: number;
    readonly height?: number;
    readonly assumePt?: boolean;
    readonly preserveAspectRatio?: string;
    readonly fontCallback?: (family: string, bold: boolean, italic: boolean) => string;
    readonly warningCallback?: (warning: string) => void;
  }
  /** Draws an SVG as vectors with its upper left corner at (x, y), points. */
  export default function svgToPdf(
    doc: PDFKit.PDFDocument,
    svg: string,
    x: number,
    y: number,
    options?: Options,
  ): void;
}
