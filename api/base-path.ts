/** Where version 1 of the API lives. */
export const BASE_PATH = "/api/v1";
