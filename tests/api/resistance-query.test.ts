import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { call, expectProblem } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
beforeAll(async () => {
  server = await startServer();
  key = server.issue().key;
});
afterAll(() => server.stop());

const get = (path: string, headers: Record<string, string> = {}) =>
  call(server, "get", `/resistance/${path}`, { key, headers });
const SLEEVE = "cylindrical-shell?innerRadius=2mm&outerRadius=5mm&length=1m";

describe("GET /resistance/{shape} 200", () => {
  test("the same as POST, with units in the values", async () => {
    const query = await get(
      `${SLEEVE}&material=copper-annealed&temperature=75&voltage=1%20mV&include=steps,checks`,
    );
    expect(query.status).toBe(200);
    const body = await call(server, "post", "/resistance", {
      key,
      body: {
        shape: "cylindrical-shell",
        dimensions: { innerRadius: "2mm", outerRadius: "5mm", length: "1m" },
        medium: { material: "copper-annealed" },
        operating: { temperature: 75, voltage: "1 mV" },
        include: ["steps", "checks"],
      },
    });
    expect(query.body).toEqual(body.body);
  });

  test("bare numbers are in SI, a dimension named thickness is the shape's", async () => {
    const response = await get("bar?length=1&width=0.05&thickness=0.01&resistivity=1.72e-8");
    expect(response.body.resistance.value).toBeCloseTo((1.72e-8 * 1) / (0.05 * 0.01), 15);
    const conductivity = await get("bar?length=1&width=0.05&thickness=0.01&conductivity=58%20MS/m");
    expect(conductivity.status).toBe(200);
  });

  test("two media by prefix, whole numbers, choices, radius or diameter", async () => {
    const clad = await get(
      "clad-wire?length=1m&coreDiameter=1mm&claddingThickness=0.1mm&core.resistivity=1e-7&cladding.conductivity=58%20MS/m",
    );
    expect(clad.status).toBe(200);
    const body = await call(server, "post", "/resistance", {
      key,
      body: {
        shape: "clad-wire",
        dimensions: { length: "1m", coreDiameter: "1mm", claddingThickness: "0.1mm" },
        media: { core: { resistivity: 1e-7 }, cladding: { conductivity: "58 MS/m" } },
      },
    });
    expect(clad.body).toEqual(body.body);
    const layered = await get(
      "earth-rod-layered?length=3&diameter=16mm&upperDepth=5&upper.resistivity=100&lower.resistivity=300&format=text",
    );
    // 6-checks, two layers, recomputed: 35.8261386744 Ω
    expect(Number(layered.text)).toBeCloseTo(35.8261386744, 6);
    const strands = await get("stranded-conductor?length=1&strands=7&strandDiameter=1mm&resistivity=1.72e-8");
    expect(strands.status).toBe(200);
    const group = await get(
      "earth-rod-group?length=3&diameter=16mm&spacing=3&count=4&arrangement=square&resistivity=100",
    );
    expect(group.status).toBe(200);
    const diameter = await get(
      "cylindrical-shell?innerDiameter=4mm&outerDiameter=10mm&length=1m&resistivity=1",
    );
    const radius = await get("cylindrical-shell?innerRadius=2mm&outerRadius=5mm&length=1m&resistivity=1");
    expect(diameter.body.resistance.value).toBeCloseTo(radius.body.resistance.value, 12);
  });

  test("a bare number as text, by Accept or by format", async () => {
    for (const response of [
      await get(`${SLEEVE}&conductivity=1e-12`, { Accept: "text/plain" }),
      await get(`${SLEEVE}&conductivity=1e-12&format=text`),
      await get(`${SLEEVE}&conductivity=1e-12&format=text`, { Accept: "application/json" }),
    ]) {
      expect(response.status).toBe(200);
      expect(response.headers["content-type"]).toMatch(/^text\/plain/);
      expect(response.text).toMatch(/^\d+(\.\d+)?$/);
      expect(Number(response.text) / ((1e12 * Math.log(2.5)) / (2 * Math.PI))).toBeCloseTo(1, 12);
    }
    const json = await get(`${SLEEVE}&conductivity=1e-12&format=json`, { Accept: "text/plain" });
    expect(json.type).toBe("application/json");
  });
});

describe("GET /resistance/{shape} 422", () => {
  const refused = async (path: string, ...parameters: string[]) => {
    const response = await get(path);
    expectProblem(response, 422, "invalid-input");
    const errors: { parameter?: string; pointer?: string; detail: string }[] = response.body.errors;
    expect(errors.map(({ parameter }) => parameter)).toEqual(parameters);
    expect(errors.every(({ pointer }) => pointer === undefined)).toBe(true);
    return errors.map(({ detail }) => detail).join(" ");
  };

  test("an unknown parameter, with the nearest dimension", async () => {
    expect(await refused(`${SLEEVE}&lenght=1&conductivity=1`, "lenght")).toContain("length");
  });
  test("a missing dimension", async () => {
    await refused("bar?length=1&width=1&resistivity=1", "thickness");
  });
  test("a wrong unit", async () => {
    await refused("bar?length=1kg&width=1&thickness=1&resistivity=1", "length");
    await refused("bar?length=1&width=1&thickness=1&resistivity=1m", "resistivity");
    await refused("bar?length=1&width=1&thickness=1&resistivity=1&temperature=5kg", "temperature");
  });
  test("no medium, an unknown material, a wrong include, a value twice", async () => {
    await refused("bar?length=1&width=1&thickness=1", "material");
    await refused("bar?length=1&width=1&thickness=1&material=unobtainium", "material");
    await refused("bar?length=1&width=1&thickness=1&resistivity=1&include=stepz", "include");
    await refused("bar?length=1&length=2&width=1&thickness=1&resistivity=1", "length");
    await refused("bar?length=1&width=1&thickness=1&resistivity=1&extrapolate=maybe", "extrapolate");
    await refused("bar?length=1&width=1&thickness=1&resistivity=1&format=xml", "format");
  });
  test("the media of a shape with two are told by their prefix", async () => {
    const wire = "clad-wire?length=1m&coreDiameter=1mm&claddingThickness=0.1mm";
    await refused(`${wire}&core.material=unobtainium&cladding.resistivity=1`, "core.material");
    await refused(`${wire}&core.resistivity=5kg&cladding.resistivity=1`, "core.resistivity");
    const missing = await get(`${wire}&core.resistivity=1`);
    expectProblem(missing, 422, "invalid-input");
    expect(missing.body.errors[0].parameter).toMatch(/^cladding/);
    const wrong = await get(`${wire}&core.resistivity=1&jacket.resistivity=1&cladding.resistivity=1`);
    expectProblem(wrong, 422, "invalid-input");
    expect(wrong.body.errors.map(({ parameter }: { parameter: string }) => parameter)).toEqual([
      "jacket.resistivity",
    ]);
    const plain = await get(`${wire}&resistivity=1`);
    expectProblem(plain, 422, "invalid-input");
    await refused("stranded-conductor?length=1&strands=2.5&strandDiameter=1mm&resistivity=1", "strands");
    await refused(
      "earth-rod-group?length=3&diameter=16mm&spacing=3&count=4&arrangement=circle&resistivity=100",
      "arrangement",
    );
  });
  test("two media", async () => {
    const response = await get("bar?length=1&width=1&thickness=1&resistivity=1&conductivity=1");
    expectProblem(response, 422, "invalid-input");
    expect(["resistivity", "conductivity"]).toContain(response.body.errors[0].parameter);
  });
});

describe("errors in text form keep their status and are one line", () => {
  test.each([
    ["422", "bar?length=1kg&width=1&thickness=1&resistivity=1&format=text", 422],
    ["404", "nothing?format=text", 404],
  ])("%s", async (_, path, status) => {
    const response = await get(path);
    expect(response.status).toBe(status);
    expect(response.headers["content-type"]).toMatch(/^text\/plain/);
    expect(response.text).toMatch(/^error: [^\n]+$/);
  });

  test("401 and 429 too, with their headers", async () => {
    const response = await call(server, "get", "/resistance/bar?length=1&format=text");
    expect(response.status).toBe(401);
    expect(response.text).toMatch(/^error: /);
    expect(response.headers["www-authenticate"]).toBe('Bearer realm="rhoform"');
    const narrow = server.issue({ quotas: { minute: 1, month: 10 } }).key;
    const path = "/resistance/bar?length=1&width=1&thickness=1&resistivity=1&format=text";
    expect((await call(server, "get", path, { key: narrow })).status).toBe(200);
    const limited = await call(server, "get", path, { key: narrow });
    expect(limited.status).toBe(429);
    expect(limited.text).toMatch(/^error: /);
    expect(Number(limited.headers["retry-after"])).toBeGreaterThan(0);
  });
});

describe("a medium that is not given", () => {
  const wire = "clad-wire?length=1&coreDiameter=1mm&claddingThickness=0.1mm&core.material=copper-annealed";
  test("is pointed at by the parameter that would name it", async () => {
    const response = await get(wire);
    expectProblem(response, 422, "invalid-input");
    expect(response.body.errors).toEqual([{ parameter: "cladding.material", detail: "is required." }]);
  });
});
