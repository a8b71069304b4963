/** Addresses of pages with long tables: what a server would refuse as too long goes behind the "#". */

/** Longest value in the query, and longest query; servers and mail programs cut or refuse much longer addresses. */
const LONGEST_VALUE = 1500;
const LONGEST_QUERY = 6000;

export interface AddressParts {
  readonly query: string;
  /** Without the "#"; empty where everything fits the query. */
  readonly behind: string;
}

/** Moves the long values of a query behind the "#" where the query would be too long. */
export function splitAddress(query: string): AddressParts {
  if (query.length <= LONGEST_QUERY) return { query, behind: "" };
  const pairs = query.split("&");
  const long = pairs.filter((pair) => pair.length > LONGEST_VALUE);
  return { query: pairs.filter((pair) => !long.includes(pair)).join("&"), behind: long.join("&") };
}

/** All pairs of an address, those behind the "#" last. */
export function joinAddress(query: string, behind: string): readonly (readonly [string, string])[] {
  return [...new URLSearchParams(query), ...new URLSearchParams(behind)];
}
