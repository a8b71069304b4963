/** Version of everything that computes; a number that moves by more than its bounds raises the major part. */
export const ENGINE_VERSION = "1.0.0";

/** Version of the set of shapes and of the meaning of their dimensions. */
export const CATALOGUE_VERSION = "1";
