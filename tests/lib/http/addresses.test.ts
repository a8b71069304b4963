import { describe, expect, test } from "vitest";
import { AddressBook, limitedAddress, PEER_HEADER } from "@/lib/http/client-address";
import { decodableTarget } from "@/lib/http/incoming-requests";
import { isOwnOrigin } from "@/lib/http/origin";

const headers = (peer: string, forwarded?: string) =>
  new Headers({ [PEER_HEADER]: peer, ...(forwarded === undefined ? {} : { "X-Forwarded-For": forwarded }) });

describe("the caller's address", () => {
  test("is the socket's, whatever the client claims", () => {
    const book = new AddressBook([]);
    expect(book.clientAddress(headers("203.0.113.5", "198.51.100.1"))).toBe("203.0.113.5");
    expect(book.clientAddress(headers("::ffff:203.0.113.5"))).toBe("203.0.113.5");
    expect(book.clientAddress(new Headers({ "X-Forwarded-For": "198.51.100.1" }))).toBe("unknown");
  });

  test("is what trusted proxies saw, read from the right", () => {
    const book = new AddressBook(["10.0.0.0/8", "192.0.2.7", "2001:db8::/32"]);
    const of = (peer: string, forwarded: string) => book.clientAddress(headers(peer, forwarded));
    expect(of("10.1.2.3", "198.51.100.1")).toBe("198.51.100.1");
    expect(of("10.1.2.3", "6.6.6.6, 198.51.100.1, 192.0.2.7")).toBe("198.51.100.1");
    expect(of("2001:db8::1", "2001:470::5")).toBe("2001:470::5");
    expect(of("203.0.113.5", "198.51.100.1")).toBe("203.0.113.5");
    expect(of("10.1.2.3", "198.51.100.1:5432")).toBe("198.51.100.1");
    expect(of("10.1.2.3", "not an address")).toBe("10.1.2.3");
    expect(of("10.1.2.3", "10.9.9.9")).toBe("10.9.9.9");
    expect(of("10.1.2.3", "")).toBe("10.1.2.3");
  });

  test("a trusted proxy must be an address or a network", () => {
    expect(() => new AddressBook(["proxy.example"])).toThrow(/proxy\.example/);
    expect(() => new AddressBook(["10.0.0.0/99"])).toThrow();
  });

  test("IPv6 customers are counted by their network", () => {
    expect(limitedAddress("198.51.100.1")).toBe("198.51.100.1");
    for (const address of ["2001:db8:1:2:3:4:5:6", "2001:0db8:0001:0002::9", "2001:DB8:1:2::"]) {
      expect(limitedAddress(address)).toBe("2001:db8:1:2::/64");
    }
    expect(limitedAddress("::1")).toBe("0:0:0:0::/64");
    expect(limitedAddress("unknown")).toBe("unknown");
  });
});

describe("addresses of calls", () => {
  test("that cannot be decoded are taken for what they look like", () => {
    expect(decodableTarget("/a%20b?x=%zz")).toBe("/a%20b?x=%zz");
    expect(decodableTarget("/%zz?x=1")).toBe("/%25zz?x=1");
    expect(decodableTarget("/%ff%41")).toBe("/%25ff%2541");
  });

  test("own origins are the configured one and the host that was called", () => {
    const called = new Headers({ host: "localhost:3000" });
    expect(isOwnOrigin("https://rhoform.example", called, "https://rhoform.example")).toBe(true);
    expect(isOwnOrigin("http://localhost:3000", called, "https://rhoform.example")).toBe(true);
    for (const origin of ["http://localhost:3001", "null", "", "https://elsewhere.example"]) {
      expect(isOwnOrigin(origin, called, "https://rhoform.example")).toBe(false);
    }
  });
});
