/** Where a tab keeps the key that its reader typed into the docs; gone with the tab. */
export const KEY_PLACE = "rhoform-docs-key";
