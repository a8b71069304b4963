/**
 * Widgets in your own page: types of the element that `/embed/v1.js` defines, and a way to load it once. The element
 * fires `rhoform:ready`, `rhoform:result` and `rhoform:error`.
 */
import type { AnsweredResistance, FieldResult } from "./generated/types.gen.js";

/** Values of a widget's open inputs by name, as its fields would take them: `{ length: "250 mm" }`. */
export type EmbedValues = Readonly<Record<string, string | number>>;

/** What a widget says once it can be used. */
export interface EmbedReady {
  readonly title: string;
  /** Its open inputs with what they start with. */
  readonly inputs: readonly { readonly name: string; readonly value: string }[];
}

/** A result is the API's own: of a shape, or of a field solution where the widget is on an outline (`method` "field"). */
export type EmbedResult = AnsweredResistance | NonNullable<FieldResult>;

/** Why a widget has no answer, or is not there. */
export interface EmbedError {
  /**
   * `fields` (values that cannot be used), `failed` (no field solution), `quota`, `pause`, `away`, `gone`, `stale` of the
   * frame; `not-found`, `withdrawn` in its place; `refused`, `away`, `policy` where the page cannot show it.
   */
  readonly code: string;
  readonly message: string;
  /** Complaints by input, for `fields`. */
  readonly errors?: Readonly<Record<string, string>>;
}

export interface EmbedEventMap {
  "rhoform:ready": CustomEvent<EmbedReady>;
  "rhoform:result": CustomEvent<EmbedResult>;
  "rhoform:error": CustomEvent<EmbedError>;
}

/** `<rhoform-embed>`. */
export interface RhoformEmbedElement extends HTMLElement {
  /** The last result; null before the first one. */
  readonly result: EmbedResult | null;
  /** Sets open inputs; kept for the frame where it is not ready yet. */
  set(values: EmbedValues): void;
  /** Asks for the answer, also to what was asked for before. */
  compute(): void;
  addEventListener<Type extends keyof EmbedEventMap>(
    type: Type,
    listener: (event: EmbedEventMap[Type]) => void,
    options?: boolean | AddEventListenerOptions,
  ): void;
  addEventListener(
    type: string,
    listener: EventListenerOrEventListenerObject,
    options?: boolean | AddEventListenerOptions,
  ): void;
}

declare global {
  interface HTMLElementTagNameMap {
    "rhoform-embed": RhoformEmbedElement;
  }
}

const loading = new Map<string, Promise<void>>();

/**
 * Loads the element from the service once a page; resolves when it is defined.
 * @param origin Where the service answers: `https://rhoform.example`.
 * @param nonce For pages whose policy allows scripts by nonce.
 * @throws Error where the script cannot be loaded; the next call tries again.
 */
export function loadEmbeds(origin: string, { nonce }: { readonly nonce?: string } = {}): Promise<void> {
  if (customElements.get("rhoform-embed")) return Promise.resolve();
  const address = new URL("/embed/v1.js", origin).href;
  const known = loading.get(address);
  if (known) return known;
  const promise = new Promise<void>((resolve, reject) => {
    const script = document.createElement("script");
    script.src = address;
    script.async = true;
    if (nonce !== undefined) script.nonce = nonce;
    script.addEventListener("load", () => resolve());
    script.addEventListener("error", () => {
      script.remove();
      loading.delete(address);
      reject(new Error(`The widgets of ${origin} could not be loaded.`));
    });
    document.head.append(script);
  });
  loading.set(address, promise);
  return promise;
}
