import { describe, expect, it } from "vitest";
import fc from "fast-check";
import { compileExpression } from "@/lib/engine";

const value = (text: string, s = 0, u = 0): number => {
  const reading = compileExpression(text, ["s", "u"]);
  if (!reading.ok) throw new Error(reading.detail);
  return reading.expression.evaluate(s, u);
};
const refusal = (text: string): string => {
  const reading = compileExpression(text, ["s", "u"]);
  if (reading.ok) throw new Error(`${text} was compiled`);
  return reading.detail;
};

describe("an expression", () => {
  it.each<[string, number]>([
    ["1+2*3", 7],
    ["(1+2)*3", 9],
    ["2^3^2", 512],
    ["-2^2", -4],
    ["2^-1", 0.5],
    ["8/4/2", 1],
    ["7-2-1", 4],
    ["1.5e3", 1500],
    ["pi", Math.PI],
    ["e", Math.E],
    ["abs(-3)", 3],
    ["sqrt(16)", 4],
    ["cbrt(27)", 3],
    ["exp(1)", Math.E],
    ["log(e)", 1],
    ["log10(1000)", Math.log10(1000)],
    ["sin(1)", Math.sin(1)],
    ["cos(1)", Math.cos(1)],
    ["tan(1)", Math.tan(1)],
    ["asin(0.5)", Math.asin(0.5)],
    ["acos(0.5)", Math.acos(0.5)],
    ["atan(1)", Math.PI / 4],
    ["sinh(1)", Math.sinh(1)],
    ["cosh(1)", Math.cosh(1)],
    ["tanh(1)", Math.tanh(1)],
    ["erf(0)", 0],
    ["erfc(0)", 1],
    ["min(3,1,2)", 1],
    ["max(3,1,2)", 3],
    ["if(1<2,10,20)", 10],
    ["if(1>2,10,20)", 20],
    ["if(2<=2,10,20)", 10],
    ["if(2>=3,10,20)", 20],
    ["if(2==2,10,20)", 10],
    ["if(2!=2,10,20)", 20],
    ["if((1+1)<3,if(1<0,1,2),3)", 2],
    ["+5", 5],
    ["1 +\n 1", 2],
  ])("%s is %d", (text, expected) => {
    expect(value(text)).toBe(expected);
  });

  it("takes its two variables under their own names", () => {
    expect(value("s+10*u", 3, 0.5)).toBe(8);
    const plan = compileExpression("5e7*exp(-x/0.01)+y", ["x", "y"]);
    expect(plan.ok && plan.expression.evaluate(0, 1)).toBe(50000001);
    expect(refusal("x")).toContain("unknown name");
  });

  it("tells where it may switch", () => {
    const reading = compileExpression("if(u<0.3,1,2)+abs(s-1)+max(u,0.5)", ["s", "u"]);
    if (!reading.ok) throw new Error(reading.detail);
    expect(reading.expression.switches.map((f) => f(1, 0.3))).toEqual([0, 0, -0.2]);
  });

  it("counts nodes and levels: 200 and 32 are allowed, more are not", () => {
    const sum = (terms: number): string => Array(terms).fill("u").join("+");
    expect(compileExpression(sum(100), ["s", "u"])).toMatchObject({ ok: true, expression: { nodes: 199 } });
    expect(refusal(sum(101))).toContain("200");
    const nested = (levels: number): string => `${"sin(".repeat(levels)}u${")".repeat(levels)}`;
    expect(compileExpression(nested(31), ["s", "u"]).ok).toBe(true);
    expect(refusal(nested(32))).toContain("32 levels");
    expect(compileExpression("u".padEnd(1000, " "), ["s", "u"]).ok).toBe(true);
    expect(refusal("u".padEnd(1001, " "))).toContain("1001 characters");
  });

  it("is never evaluated as a program", () => {
    for (const text of [
      "constructor",
      "__proto__",
      "toString",
      "process",
      "globalThis",
      "this",
      "s.constructor.constructor",
      'import("fs")',
      "eval(1)",
      "createUnit(1)",
      "parse(1)",
      "simplify(1)",
      "derivative(1,u)",
      "s => 1",
      "`1`",
      "s[0]",
      "{a:1}",
      "f(x)=x",
      "s=1",
      "1;2",
      "1:5",
      "u'",
      "u!",
      "5%",
      "not u",
      "u and s",
      "true",
      "null",
      "NaN",
      "Infinity",
      "i",
      "0x10",
      "2 cm",
      "u to s",
      "random()",
      "unit(5)",
    ]) {
      expect(refusal(text).length, text).toBeGreaterThan(5);
    }
  });

  it("never throws, whatever the text", () => {
    const piece = fc.constantFrom(
      "s",
      "u",
      "1",
      "2.5",
      "+",
      "-",
      "*",
      "/",
      "^",
      "(",
      ")",
      "sin",
      "if",
      ",",
      "<",
      "==",
      " ",
      ".",
      "e",
      "x",
      "min(",
      "!",
      "=",
      "[",
      '"',
    );
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 40 }), (pieces) => {
        const reading = compileExpression(pieces.join(""), ["s", "u"]);
        if (reading.ok) expect(typeof reading.expression.evaluate(1, 0.5)).toBe("number");
        else expect(reading.detail.length).toBeGreaterThan(5);
      }),
      { seed: 31, numRuns: 1500 },
    );
  });
});
