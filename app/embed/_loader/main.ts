/** What `/embed/v1.js` runs in the pages of other teams: bundled alone, without anything of a framework. */
import { defineEmbedElement } from "./embed-element";

const script = document.currentScript;
// As a module it has no element of its own; its own address tells the same.
const address = script instanceof HTMLScriptElement ? script.src : "";
const origin = address === "" ? "%ORIGIN%" : new URL(address).origin;

defineEmbedElement(origin);
