import type { Method, Operation } from "./operation";

export interface Match {
  /** The operation, or undefined where the path exists without this method. */
  readonly operation: Operation | undefined;
  readonly path: Readonly<Record<string, string>>;
  /** Methods of the path, as `Allow` lists them. */
  readonly allow: readonly string[];
}

interface Route {
  readonly segments: readonly string[];
  readonly operations: Map<Method, Operation>;
}

/** Finds the operation of a method and path. What is registered here exists, whatever serves it. */
export class RouteTable {
  private readonly routes: Route[] = [];

  constructor(readonly operations: readonly Operation[]) {
    const byPath = new Map<string, Route>();
    for (const operation of operations) {
      let route = byPath.get(operation.path);
      if (!route) {
        route = { segments: operation.path.split("/").slice(1), operations: new Map() };
        byPath.set(operation.path, route);
        this.routes.push(route);
      }
      if (route.operations.has(operation.method)) {
        throw new Error(`${operation.method} ${operation.path} is registered twice.`);
      }
      route.operations.set(operation.method, operation);
    }
    // A fixed segment goes before a placeholder: /fields/{id} never hides /fields/events.
    const weight = (route: Route) =>
      route.segments.map((part) => (part.startsWith("{") ? "1" : "0")).join("");
    this.routes.sort((a, b) => weight(a).localeCompare(weight(b)));
  }

  /** `path` is below the base path, still encoded: `/records/rec_1`. Undefined where nothing is registered. */
  match(method: string, path: string): Match | undefined {
    const given = path.split("/").slice(1);
    for (const route of this.routes) {
      const values = fit(route.segments, given);
      if (!values) continue;
      const methods = [...route.operations.keys()];
      const allow = [...methods, ...(route.operations.has("GET") ? ["HEAD"] : []), "OPTIONS"];
      const wanted = method === "HEAD" ? "GET" : method;
      const found = methods.find((entry) => entry === wanted);
      return { operation: found && route.operations.get(found), path: values, allow };
    }
    return undefined;
  }
}

function fit(segments: readonly string[], given: readonly string[]): Record<string, string> | undefined {
  if (segments.length !== given.length) return undefined;
  const values: [string, string][] = [];
  for (const [i, segment] of segments.entries()) {
    if (!segment.startsWith("{")) {
      if (segment !== given[i]) return undefined;
      continue;
    }
    try {
      const value = decodeURIComponent(given[i]);
      if (value === "") return undefined;
      values.push([segment.slice(1, -1), value]);
    } catch {
      return undefined;
    }
  }
  return Object.fromEntries(values);
}
