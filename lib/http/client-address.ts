import { BlockList, isIP } from "node:net";

/** Header in which the server notes the address of the socket; whatever a client sends under it is overwritten. */
export const PEER_HEADER = "x-rhoform-peer";

/** Tells who calls: the socket's address, or what a trusted proxy says of it. */
export class AddressBook {
  private readonly proxies = new BlockList();

  /** Addresses and networks (`10.0.0.0/8`) of the trusted proxies. Throws on an entry that is neither. */
  constructor(trusted: readonly string[]) {
    for (const entry of trusted) {
      const [address, bits] = entry.split("/");
      const version = isIP(address);
      if (version === 0)
        throw new Error(`RHOFORM_TRUSTED_PROXIES: "${entry}" is not an address or a network.`);
      const family = version === 4 ? "ipv4" : "ipv6";
      if (bits === undefined) this.proxies.addAddress(address, family);
      else this.proxies.addSubnet(address, Number(bits), family);
    }
  }

  private isProxy(address: string): boolean {
    const version = isIP(address);
    return version !== 0 && this.proxies.check(address, version === 4 ? "ipv4" : "ipv6");
  }

  /**
   * The caller's address. `X-Forwarded-For` counts only as far as trusted proxies wrote it: read from the right, the
   * first address that is no trusted proxy. "unknown" where the socket's address was not noted.
   */
  clientAddress(headers: Headers): string {
    let address = plainAddress(headers.get(PEER_HEADER) ?? "");
    if (address === "") return "unknown";
    const forwarded = (headers.get("x-forwarded-for") ?? "")
      .split(",")
      .map((part) => plainAddress(part.trim()));
    while (this.isProxy(address)) {
      const before = forwarded.pop();
      if (before === undefined || isIP(before) === 0) break;
      address = before;
    }
    return address;
  }
}

/** Without the mapping of IPv4 into IPv6 and without a port. */
function plainAddress(text: string): string {
  const mapped = /^\[?::ffff:(\d+\.\d+\.\d+\.\d+)\]?(?::\d+)?$/i.exec(text);
  if (mapped) return mapped[1];
  const withPort = /^(\d+\.\d+\.\d+\.\d+):\d+$/.exec(text) ?? /^\[([0-9a-f:]+)\](?::\d+)?$/i.exec(text);
  return withPort ? withPort[1] : text;
}

/** What limits count by: an IPv4 address, or the /64 that one IPv6 customer holds. */
export function limitedAddress(address: string): string {
  if (isIP(address) !== 6) return address;
  const [head, tail = ""] = address.split("::");
  const left = head === "" ? [] : head.split(":");
  const right = tail === "" ? [] : tail.split(":");
  const groups = address.includes("::")
    ? [...left, ...Array<string>(Math.max(0, 8 - left.length - right.length)).fill("0"), ...right]
    : left;
  return `${groups
    .slice(0, 4)
    .map((group) => group.toLowerCase().replace(/^0+(?=.)/, ""))
    .join(":")}::/64`;
}
