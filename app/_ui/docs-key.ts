/** Where a tab keeps the key of its reader for the docs; gone with the tab, and in no address and no call of ours. */
export const KEY_PLACE = "rhoform-docs-key";

const CHANGED = "rhoform-docs-key-changed";
const KEY = /^rho_[A-Za-z0-9_-]+$/;

/** Whether a text has the form of a key. */
export function looksLikeKey(text: string): boolean {
  return KEY.test(text);
}

/** The key that the tab keeps; empty where there is none, or where storage is forbidden. */
export function keptKey(): string {
  try {
    return sessionStorage.getItem(KEY_PLACE) ?? "";
  } catch {
    return "";
  }
}

/** Keeps a key in this tab; an empty text forgets it. Answers whether it could. */
export function keepKey(key: string): boolean {
  try {
    if (key === "") sessionStorage.removeItem(KEY_PLACE);
    else sessionStorage.setItem(KEY_PLACE, key);
  } catch {
    return false;
  }
  window.dispatchEvent(new Event(CHANGED));
  return true;
}

/** Calls whenever the kept key changes; answers with what ends that. */
export function onKeyChange(listener: () => void): () => void {
  window.addEventListener(CHANGED, listener);
  return () => window.removeEventListener(CHANGED, listener);
}

/** A key as it may stand on a screen: enough to tell it from others. */
export function maskedKey(key: string): string {
  return `${key.slice(0, 8)}••••`;
}

/** A snippet with the key in place of the variable that it reads, in a shell, in TypeScript and in Python. */
export function withKey(code: string, key: string): string {
  return code
    .replace(/\$RHOFORM_KEY\b/g, key)
    .replace(/process\.env\.RHOFORM_KEY\b/g, `"${key}"`)
    .replace(/os\.environ\["RHOFORM_KEY"\]/g, `"${key}"`)
    .replace(/(RHOFORM_KEY ?= ?"?)rho_…/g, `$1${key}`);
}
