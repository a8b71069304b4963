"use client";

import { type RefObject, useCallback, useEffect, useRef } from "react";
import type { Values } from "./frame-api";
import { frameMessage, type FrameMessage, readHostMessage } from "./messages";

interface Host {
  readonly embed: string;
  readonly hosts: readonly string[];
  /** Element whose height the frame should have. */
  readonly content: RefObject<HTMLElement | null>;
  readonly onSet: (values: Values) => void;
  readonly onCompute: () => void;
}

/**
 * Talks with the page around the frame, and with nobody else: messages go to the widget's own origins only, and count
 * only from the window around, from one of these origins, in the form of the protocol. Returns how to tell it something.
 */
export function useHost({ embed, hosts, content, onSet, onCompute }: Host) {
  const targets = useRef<readonly string[]>([]);
  const tell = useCallback(
    (type: FrameMessage, data: unknown) => {
      if (window.parent === window) return;
      for (const target of targets.current)
        window.parent.postMessage(frameMessage(type, embed, data), target);
    },
    [embed],
  );

  useEffect(() => {
    targets.current = hostOrigins(hosts);
    const listen = (event: MessageEvent<unknown>) => {
      if (event.source !== window.parent || !hosts.includes(event.origin)) return;
      const message = readHostMessage(event.data, embed);
      if (message?.type === "set") onSet(message.values);
      else if (message) onCompute();
    };
    window.addEventListener("message", listen);
    return () => window.removeEventListener("message", listen);
  }, [embed, hosts, onSet, onCompute]);

  useEffect(() => {
    const element = content.current;
    if (!element) return undefined;
    let told = 0;
    const observer = new ResizeObserver(() => {
      const height = Math.ceil(element.getBoundingClientRect().height);
      if (height === told) return;
      told = height;
      tell("size", { height });
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, [content, tell]);

  return tell;
}

/** The origin of the page around where the browser tells it; else all that it can be, of which one will hear. */
function hostOrigins(hosts: readonly string[]): readonly string[] {
  const ancestors = window.location.ancestorOrigins as DOMStringList | undefined;
  const known = ancestors?.[0] ?? originOf(document.referrer);
  return hosts.includes(known) ? [known] : hosts;
}

function originOf(address: string): string {
  try {
    return new URL(address).origin;
  } catch {
    return "";
  }
}
