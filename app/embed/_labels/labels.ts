/** What the catalogue calls inputs, choices and coordinates, in another language; what is not there stays English. */
export type Labels = Readonly<Record<string, string>>;
