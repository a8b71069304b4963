import { type IncomingMessage, type Server, type ServerResponse, createServer } from "node:http";
import type { AddressInfo } from "node:net";

export interface SeenCall {
  readonly method: string;
  readonly url: string;
  readonly headers: IncomingMessage["headers"];
  readonly body: string;
  /** ms */
  readonly at: number;
}

export type Handler = (
  request: IncomingMessage,
  response: ServerResponse,
  call: number,
  body: string,
) => unknown;

export interface AnsweringService {
  readonly calls: SeenCall[];
  readonly baseUrl: string;
  readonly stop: () => void;
}

/** A service that answers as told, to see what a client makes of it. */
export async function answeringService(handler: Handler): Promise<AnsweringService> {
  const calls: SeenCall[] = [];
  const server: Server = createServer((request, response) => {
    const pieces: Buffer[] = [];
    request.on("data", (piece: Buffer) => pieces.push(piece));
    request.on("end", () => {
      const body = Buffer.concat(pieces).toString();
      const { method = "", url = "", headers } = request;
      calls.push({ method, url, headers, body, at: performance.now() });
      handler(request, response, calls.length, body);
    });
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  return {
    calls,
    baseUrl: `http://127.0.0.1:${port}`,
    stop: () => {
      server.closeAllConnections();
      server.close();
    },
  };
}

export function answer(
  response: ServerResponse,
  status: number,
  body: unknown,
  headers: Record<string, string> = {},
): void {
  const type = status < 400 ? "application/json" : "application/problem+json";
  response.writeHead(status, { "Content-Type": type, ...headers });
  response.end(status === 204 ? undefined : JSON.stringify(body));
}

export function problem(code: string, status: number, more: object = {}) {
  return {
    type: `https://rhoform.example/docs/problems/${code}`,
    title: "A title",
    status,
    detail: "What happened.",
    instance: "req_1",
    ...more,
  };
}
