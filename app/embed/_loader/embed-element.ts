import { linesFor } from "./lines";
import { hostMessage, readFrameMessage } from "./protocol";

/** A frame that has said nothing this long after it loaded was refused, or the service is away, ms. */
const SILENCE_MS = 4_000;
const FIRST_HEIGHT = 320;

type Values = Readonly<Record<string, string | number>>;

/**
 * `<rhoform-embed embed="emb_…" values='{"length":"1 m"}' theme="dark" lang="de">`: a widget in a frame that is as high
 * as its content. Fires `rhoform:ready`, `rhoform:result` and `rhoform:error`; takes `set(values)` and `compute()`.
 * @param origin Where the service answers.
 */
export function defineEmbedElement(origin: string): void {
  if (customElements.get("rhoform-embed")) return;

  class RhoformEmbed extends HTMLElement {
    static readonly observedAttributes = ["embed", "theme", "lang", "values"];
    /** The last result; null before the first one. */
    result: object | null = null;
    private frame: HTMLIFrameElement | null = null;
    private heard = false;
    private ready = false;
    private silence: ReturnType<typeof setTimeout> | undefined;
    private waiting: Record<string, string | number> = {};
    /** What stands in the fields: a frame that is loaded again, for another theme or language, starts with it. */
    private typed: Values = {};

    connectedCallback(): void {
      window.addEventListener("message", this.listen);
      document.addEventListener("securitypolicyviolation", this.violated);
      this.show();
    }

    disconnectedCallback(): void {
      window.removeEventListener("message", this.listen);
      document.removeEventListener("securitypolicyviolation", this.violated);
      this.clear();
    }

    attributeChangedCallback(name: string, before: string | null, after: string | null): void {
      if (!this.frame || before === after) return;
      if (name === "values") return this.set(this.startValues());
      if (name === "embed") this.typed = {};
      this.show();
    }

    /** Sets open inputs by name, as their fields would take them: "250 mm". */
    set(values: Values): void {
      // What comes before the frame listens is kept for it.
      if (this.ready) this.send("set", { values });
      else this.waiting = { ...this.waiting, ...values };
    }

    /** Asks for the answer to what stands in the fields, also if it was asked for before. */
    compute(): void {
      if (this.ready) this.send("compute", {});
    }

    private send(type: "set" | "compute", data: object): void {
      this.frame?.contentWindow?.postMessage(hostMessage(type, this.embed, data), origin);
    }

    private get embed(): string {
      return this.getAttribute("embed") ?? "";
    }

    private get language(): string {
      return this.getAttribute("lang") ?? (document.documentElement.lang || "en");
    }

    private startValues(): Values {
      try {
        const values: unknown = JSON.parse(this.getAttribute("values") ?? "{}");
        if (typeof values !== "object" || values === null) return {};
        return Object.fromEntries(
          Object.entries(values).filter(
            ([, value]) => typeof value === "string" || typeof value === "number",
          ),
        );
      } catch {
        return {};
      }
    }

    private address(): string {
      const address = new URL(`/embed/${encodeURIComponent(this.embed)}`, origin);
      for (const [name, value] of Object.entries({ ...this.startValues(), ...this.typed })) {
        address.searchParams.set(name, String(value));
      }
      // These two are the frame's own; a value of the same name does not take their place.
      address.searchParams.delete("preview");
      address.searchParams.set("lang", this.language);
      const theme = this.getAttribute("theme");
      if (theme) address.searchParams.set("theme", theme);
      else address.searchParams.delete("theme");
      return address.href;
    }

    private show(): void {
      this.clear();
      const root = this.shadowRoot ?? this.attachShadow({ mode: "open" });
      const frame = document.createElement("iframe");
      // Styles are set one by one: a page's policy may forbid a style element.
      Object.assign(this.style, { display: this.style.display || "block" });
      Object.assign(frame.style, {
        display: "block",
        width: "100%",
        maxWidth: "720px",
        minWidth: "min(320px, 100%)",
        height: `${FIRST_HEIGHT}px`,
        border: "0",
        colorScheme: "normal",
      });
      frame.title = this.getAttribute("title") ?? linesFor(this.language).title;
      // The service counts calls by page; it gets the origin, whatever else the page keeps to itself.
      frame.referrerPolicy = "origin";
      frame.addEventListener("load", () => this.waitForWord());
      frame.addEventListener("error", () => void this.explain());
      frame.src = this.address();
      root.append(frame);
      this.frame = frame;
    }

    private clear(): void {
      clearTimeout(this.silence);
      this.shadowRoot?.replaceChildren();
      this.frame = null;
      this.heard = false;
      this.ready = false;
      this.result = null;
    }

    private waitForWord(): void {
      clearTimeout(this.silence);
      if (!this.heard) this.silence = setTimeout(() => void this.explain(), SILENCE_MS);
    }

    private readonly listen = (event: MessageEvent<unknown>): void => {
      if (!this.frame || event.source !== this.frame.contentWindow || event.origin !== origin) return;
      const message = readFrameMessage(event.data, this.embed);
      if (!message) return;
      this.heard = true;
      clearTimeout(this.silence);
      if (message.type === "size") {
        this.frame.style.height = `${Math.ceil(message.height)}px`;
        return;
      }
      if (message.type === "values") {
        this.typed = message.values;
        return;
      }
      if (message.type === "ready") {
        this.ready = true;
        if (Object.keys(this.waiting).length > 0) this.send("set", { values: this.waiting });
        this.waiting = {};
      }
      if (message.type === "result") this.result = message.data;
      this.tell(message.type, message.data);
    };

    private readonly violated = (event: SecurityPolicyViolationEvent): void => {
      const frames = event.effectiveDirective === "frame-src" || event.effectiveDirective === "child-src";
      if (!frames || !event.blockedURI.startsWith(origin) || !this.frame || this.heard) return;
      this.say("policy", `${linesFor(this.language).policy} ${origin}`);
    };

    private tell(type: "ready" | "result" | "error", detail: object): void {
      this.dispatchEvent(new CustomEvent(`rhoform:${type}`, { detail, bubbles: true, composed: true }));
    }

    /** Says why a frame stays silent: the browser refused it, or the service is away. */
    private async explain(): Promise<void> {
      const { frame } = this;
      const reached = await fetch(`${origin}/api/v1/health`, { credentials: "omit" }).then(
        ({ ok }) => ok,
        () => false,
      );
      if (this.heard || !frame || this.frame !== frame) return;
      const lines = linesFor(this.language);
      if (reached) this.say("refused", `${lines.refused} ${location.origin}`);
      else this.say("away", lines.away, lines.again);
    }

    /** Puts a line in the frame's place, and a button to try again where that can help. */
    private say(code: "refused" | "away" | "policy", text: string, again?: string): void {
      const line = document.createElement("p");
      Object.assign(line.style, { margin: "0", padding: "8px 0", font: "inherit" });
      line.setAttribute("role", "status");
      line.textContent = text;
      if (again !== undefined) {
        const button = document.createElement("button");
        button.type = "button";
        button.textContent = again;
        button.addEventListener("click", () => this.show());
        line.append(" ", button);
      }
      this.clear();
      this.shadowRoot?.replaceChildren(line);
      this.tell("error", { code, message: text });
    }
  }

  customElements.define("rhoform-embed", RhoformEmbed);
}
