/** A widget as a React component. */
import { createElement, type CSSProperties, type ReactElement, useEffect, useRef, useState } from "react";
import {
  type EmbedError,
  type EmbedReady,
  type EmbedResult,
  type EmbedValues,
  loadEmbeds,
  type RhoformEmbedElement,
} from "./embed.js";

export interface RhoformEmbedProps {
  /** Where the service answers: `https://rhoform.example`. */
  readonly origin: string;
  /** Id of the widget: `emb_…`. */
  readonly embed: string;
  /** Values of open inputs; a change is passed on, what the visitor typed since is then overwritten. */
  readonly values?: EmbedValues;
  readonly theme?: "light" | "dark";
  /** BCP 47; the page's language where left out. */
  readonly lang?: string;
  /** Name of the frame for readers of the page who do not see it. */
  readonly title?: string;
  readonly nonce?: string;
  readonly className?: string;
  readonly style?: CSSProperties;
  readonly onReady?: (ready: EmbedReady) => void;
  readonly onResult?: (result: EmbedResult) => void;
  readonly onError?: (error: EmbedError) => void;
}

/** `<RhoformEmbed origin="https://rhoform.example" embed="emb_…" onResult={…} />` */
export function RhoformEmbed(props: RhoformEmbedProps): ReactElement {
  const { origin, embed, values, theme, lang, title, nonce, className, style } = props;
  const [element, setElement] = useState<RhoformEmbedElement | null>(null);
  const told = useRef(props);
  useEffect(() => {
    told.current = props;
  });

  useEffect(() => {
    loadEmbeds(origin, nonce === undefined ? {} : { nonce }).catch((error: unknown) => {
      told.current.onError?.({ code: "away", message: String(error) });
    });
  }, [origin, nonce]);

  useEffect(() => {
    if (!element) return undefined;
    const ready = (event: CustomEvent<EmbedReady>) => told.current.onReady?.(event.detail);
    const result = (event: CustomEvent<EmbedResult>) => told.current.onResult?.(event.detail);
    const failed = (event: CustomEvent<EmbedError>) => told.current.onError?.(event.detail);
    element.addEventListener("rhoform:ready", ready);
    element.addEventListener("rhoform:result", result);
    element.addEventListener("rhoform:error", failed);
    return () => {
      element.removeEventListener("rhoform:ready", ready as EventListener);
      element.removeEventListener("rhoform:result", result as EventListener);
      element.removeEventListener("rhoform:error", failed as EventListener);
    };
  }, [element]);

  return createElement("rhoform-embed", {
    ref: setElement,
    embed,
    // An attribute, so that the same values in a new object change nothing.
    values: values === undefined ? undefined : JSON.stringify(values),
    theme,
    lang,
    title,
    class: className,
    style,
  });
}
