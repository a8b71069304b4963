/** Header by which the proxy tells a widget's document its locale and theme; what a client sends under it is replaced. */
export const FRAME_HEADER = "x-rhoform-frame";
