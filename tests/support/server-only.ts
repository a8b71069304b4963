/** Stands in for the package of that name, which refuses to load outside Next's server bundle. */
export {};
