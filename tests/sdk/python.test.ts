import { join } from "node:path";
import { afterEach, describe, expect, it } from "vitest";
import {
  type AnsweringService,
  answer,
  answeringService,
  type Handler,
  problem,
} from "./support/answering-service";
import { python } from "./support/python";

const KEY = "rho_abc123_secretsecretsecret";

let running: AnsweringService | undefined;

afterEach(() => running?.stop());

async function service(handler: Handler): Promise<AnsweringService> {
  return (running = await answeringService(handler));
}

const PROLOGUE = `
import json, os, sys, threading, time
import rhoform
from rhoform import *
client = Client(os.environ["BASE"], key=os.environ["KEY"])
BAR = Bar(length=1, width=1, thickness=1)
MEDIUM = {"resistivity": 1}
def told(work):
    try:
        work()
    except RhoformProblem as error:
        print(json.dumps({"kind": "problem", "status": error.status, "code": error.code, "errors": list(error.errors),
            "requestId": error.request_id, "retryAfter": error.retry_after, "text": str(error), "shown": repr(error)}))
    except Exception as error:
        print(json.dumps({"kind": type(error).__name__, "text": str(error), "shown": repr(error)}))
    else:
        print(json.dumps({"kind": "answered"}))
`;

async function run({ baseUrl }: { baseUrl: string }, code: string): Promise<string> {
  const ran = await python(["-c", `${PROLOGUE}\n${code}`], { BASE: baseUrl, KEY });
  expect(ran.err).toBe("");
  expect(ran.out + ran.err).not.toContain("secretsecret");
  return ran.out.trim();
}

async function told(baseUrl: { baseUrl: string }, work: string): Promise<Record<string, unknown>> {
  return JSON.parse(await run(baseUrl, `told(lambda: ${work})`));
}

const RESULT = {
  shape: "bar",
  resistance: {
    value: 1,
    unit: "ohm",
    text: "1 Ω",
    lower: 0.9,
    upper: 1.1,
    boundsBasis: "rounding",
    proved: true,
  },
  conductance: { value: 1, unit: "siemens", text: "1 S" },
  method: "closed-form",
  operating: { temperature: 20 },
  cautions: [],
  assumptions: [],
  sources: [],
  materials: [],
  engine: "1.0.0",
  catalogue: "1",
  somethingNew: { later: true },
};

describe("calls", () => {
  it("200: sends key, body and a fresh idempotency key, and reads the answer with its names", async () => {
    const served = await service((_request, response) => answer(response, 200, RESULT));
    const out = await run(
      served,
      `a = client.resistance(CylindricalShell(inner_radius="2 mm", outer_radius="5 mm", length="1 m"), MEDIUM, operating={"temperature": 75})
print(a.resistance.text, a.resistance.bounds_basis, a.resistance.proved, a.record, rhoform.to_dict(a)["resistance"]["boundsBasis"])
client.resistance(BAR, MEDIUM)`,
    );
    expect(out).toBe("1 Ω rounding True None rounding");
    expect(served.calls[0]).toMatchObject({ method: "POST", url: "/api/v1/resistance" });
    expect(served.calls[0].headers.authorization).toBe(`Bearer ${KEY}`);
    expect(JSON.parse(served.calls[0].body)).toEqual({
      shape: "cylindrical-shell",
      dimensions: { innerRadius: "2 mm", outerRadius: "5 mm", length: "1 m" },
      medium: { resistivity: 1 },
      operating: { temperature: 75 },
    });
    const keys = served.calls.map(({ headers }) => headers["idempotency-key"]);
    expect(new Set(keys).size).toBe(2);
  });

  it("202: a field job is asked after until it ends, with its progress", async () => {
    const field = (status: string, lower?: number) => ({
      id: "field_1",
      status,
      createdAt: "2026-01-01T00:00:00Z",
      finishedAt: null,
      progress: lower === undefined ? null : { lower, upper: 2, unknowns: 10, refinements: 1 },
      result: null,
    });
    const served = await service((request, response, call) =>
      request.method === "POST"
        ? answer(response, 202, field("queued"), { Location: "/api/v1/fields/field_1" })
        : answer(response, 200, field(call < 4 ? "running" : "done", call < 3 ? undefined : 3)),
    );
    const out = await run(
      served,
      `job = client.start_field({"outlineId": "x"})
seen = []
ended = job.wait(every=0.01, on_progress=lambda bracket: seen.append(bracket.lower))
print(ended.status, seen, job.ended)`,
    );
    // A bracket is told once, and none before the first.
    expect(out).toBe("done [3] True");
    expect(served.calls.map(({ method }) => method)).toEqual(["POST", "GET", "GET", "GET"]);
  });

  it("204: stopping a job cancels it", async () => {
    let cancelled = false;
    const field = () => ({
      id: "field_1",
      status: cancelled ? "cancelled" : "running",
      createdAt: "",
      finishedAt: null,
      progress: null,
      result: null,
    });
    const served = await service((request, response) => {
      if (request.method === "DELETE") cancelled = true;
      answer(response, request.method === "DELETE" ? 204 : 200, field());
    });
    const out = await run(
      served,
      `stop = threading.Event(); stop.set()
try:
    client.field({}, stop=stop)
except RhoformStopped as error:
    print(error)`,
    );
    expect(out).toBe("The field solution field_1 was cancelled.");
    expect(served.calls.map(({ method }) => method)).toContain("DELETE");
  });

  it("any case of base address, and a page of a list after the other", async () => {
    const served = await service((_request, response, call) =>
      answer(response, 200, { items: [], next: call === 1 ? "c2" : null }),
    );
    await run(
      { baseUrl: `${served.baseUrl}/api/v1/` },
      `list(client.pages(client.list_records, shape="bar"))`,
    );
    expect(served.calls.map(({ url }) => url)).toEqual([
      "/api/v1/records?shape=bar",
      "/api/v1/records?cursor=c2&shape=bar",
    ]);
  });
});

describe("refusals", () => {
  it("422 is a problem with its complaints", async () => {
    const errors = [{ pointer: "#/dimensions/width", detail: "must be greater than 0." }];
    const served = await service((_request, response) =>
      answer(response, 422, problem("invalid-input", 422, { errors })),
    );
    const error = await told(served, "client.resistance(BAR, MEDIUM)");
    expect(error).toMatchObject({ kind: "problem", status: 422, errors, requestId: "req_1" });
    expect(error.text).toContain("#/dimensions/width must be greater than 0.");
  });

  it("an answer that is no problem document is told by its status; a redirect is not followed", async () => {
    const served = await service((_request, response) => {
      response.writeHead(302, { Location: "http://127.0.0.1:9/" });
      response.end("<p>elsewhere</p>");
    });
    expect(await told(served, "client.read_health()")).toMatchObject({
      kind: "problem",
      status: 302,
      code: "unknown",
    });
  });
});

describe("the way there", () => {
  it("a slow answer is a timeout, a slow body too", async () => {
    const served = await service((_request, response) => {
      response.writeHead(200, { "Content-Type": "application/json" });
      const timer = setInterval(() => response.write(" "), 50);
      response.on("close", () => clearInterval(timer));
    });
    const work = `Client("${served.baseUrl}", timeout=0.3, retries=0).read_health()`;
    expect(await told(served, work)).toMatchObject({ kind: "RhoformTimeout" });
  });

  it("a body that breaks off is no answer", async () => {
    const served = await service((request, response) => {
      response.writeHead(200, { "Content-Type": "application/json", "Content-Length": "100" });
      response.write('{"status":"ok"}', () => request.socket.destroy());
    });
    const work = `Client("${served.baseUrl}", retries=0).read_health()`;
    expect(await told(served, work)).toMatchObject({ kind: "RhoformUnreachable" });
  });

  it("nobody answers", async () => {
    const error = await told(
      { baseUrl: "http://127.0.0.1:9" },
      'Client("http://127.0.0.1:9", retries=0).read_health()',
    );
    expect(error).toMatchObject({ kind: "RhoformUnreachable" });
    expect(error.text).toContain("127.0.0.1:9");
  });
});

describe("batches", () => {
  it("are cut to the limits, keep their order, and ask again for what there was no time for", async () => {
    const served = await service((_request, response, call, body) => {
      const { items }: { items: { label: number }[] } = JSON.parse(body);
      const answered = items.map((item, index) =>
        call === 2 && index >= 10
          ? { index, status: 503, problem: problem("busy", 503) }
          : { index, status: 200, result: { ...RESULT, engine: String(item.label) } },
      );
      answer(response, 200, { items: answered, counts: { answered: 0, refused: 0, notComputed: 0 } });
    });
    const out = await run(
      served,
      `items = client.batch({"label": index} for index in range(2500))
print(len(items), all(item.index == index and item.result.engine == str(index) for index, item in enumerate(items)))`,
    );
    expect(out).toBe("2500 True");
    expect(served.calls.map(({ body }) => JSON.parse(body).items.length)).toEqual([1000, 1000, 990, 500]);
  });
});

describe("the key", () => {
  it("is in no print of the client, and a wrong one is refused without being shown", async () => {
    const out = await run(
      { baseUrl: "http://127.0.0.1:9" },
      `print(client, vars(client))
told(lambda: Client("http://127.0.0.1", key="hunter2\\n"))
told(lambda: Client("127.0.0.1", key="rho_x"))`,
    );
    expect(out).toContain("Client('http://127.0.0.1:9/api/v1')");
    expect(out).not.toContain("hunter2");
  });
});

describe("python -m rhoform", () => {
  it("prints a resistance with its bounds", async () => {
    const served = await service((_request, response) => answer(response, 200, RESULT));
    const variables = { RHOFORM_URL: served.baseUrl, RHOFORM_KEY: KEY };
    const ran = await python(
      ["-m", "rhoform", "resistance", "bar", "length=1m", "core.material=x"],
      variables,
    );
    expect(ran).toEqual({ code: 0, out: "1 Ω\n0.9 ... 1.1 ohm, proved (rounding)\n", err: "" });
    expect(served.calls[0].url).toBe("/api/v1/resistance/bar?length=1m&core.material=x");
  });

  it("a table with a row that was refused leaves with 1", async () => {
    const table = "shape;status;problem\r\nbar;200;\r\nbar;422;no\r\n";
    const served = await service((_request, response) => {
      response.writeHead(200, { "Content-Type": "text/csv; charset=utf-8" });
      response.end(table);
    });
    const variables = { RHOFORM_URL: served.baseUrl, RHOFORM_KEY: KEY };
    const ran = await python(["-m", "rhoform", "batch", join(process.cwd(), "README.md")], variables);
    expect([ran.code, ran.err]).toEqual([1, "1 row was not answered.\n"]);
    expect(ran.out).toContain("bar;422;no");
  });

  it("refusals leave with 1, mistakes with 2, and neither shows the key", async () => {
    const served = await service((_request, response) => answer(response, 401, problem("invalid-key", 401)));
    const variables = { RHOFORM_URL: served.baseUrl, RHOFORM_KEY: KEY };
    const refused = await python(["-m", "rhoform", "call", "readUsage"], variables);
    expect(refused.code).toBe(1);
    expect(refused.err).toContain("401");
    const wrong = await python(["-m", "rhoform", "guess"], variables);
    expect(wrong.code).toBe(2);
    expect(wrong.err).toContain("There is no command 'guess'.");
    const many = await python(
      ["-m", "rhoform", "batch", "a.csv", "b.csv", "--url", served.baseUrl],
      variables,
    );
    expect([many.code, many.err.split("\n")[0]]).toEqual([
      2,
      "batch needs one file, and was given 2 arguments.",
    ]);
    expect(refused.err + wrong.err).not.toContain("secretsecret");
  });
});
