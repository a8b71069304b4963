import { expiryText } from "../auth/key-expiry";
import type { Letter } from "./letter";

interface Addressee {
  readonly name: string;
}

const hello = ({ name }: Addressee) => `Hello ${name},`;

/** A moment as mails tell it: "3 May 2026, 14:05 UTC". */
export function momentText(at: number): string {
  const date = new Date(at);
  const day = date.toLocaleDateString("en-GB", {
    day: "numeric",
    month: "long",
    year: "numeric",
    timeZone: "UTC",
  });
  return `${day}, ${date.toISOString().slice(11, 16)} UTC`;
}

export function invitationLetter(
  to: Addressee,
  { by, url, until }: { readonly by: string; readonly url: string; readonly until: number },
): Letter {
  return {
    subject: "Your access to Rhoform",
    greeting: hello(to),
    paragraphs: [`${by} has given you access to Rhoform. Choose a password to begin.`],
    action: { label: "Choose a password", url },
    closing: [`The link works once, until ${momentText(until)}.`],
  };
}

export function resetLetter(
  to: Addressee,
  { url, until }: { readonly url: string; readonly until: number },
): Letter {
  return {
    subject: "A new password for Rhoform",
    greeting: hello(to),
    paragraphs: ["Somebody, probably you, asked to choose a new password for your account."],
    action: { label: "Choose a new password", url },
    closing: [
      `The link works once, until ${momentText(until)}.`,
      "If you did not ask for it, do nothing: your password stays as it is.",
    ],
  };
}

export function emailChangeLetter(
  to: Addressee,
  { url, until }: { readonly url: string; readonly until: number },
): Letter {
  return {
    subject: "Confirm your e-mail address",
    greeting: hello(to),
    paragraphs: ["You asked to sign in to Rhoform with this address from now on."],
    action: { label: "Confirm this address", url },
    closing: [
      `The link works once, until ${momentText(until)}. Until then your old address counts.`,
      "If you did not ask for it, do nothing.",
    ],
  };
}

export function emailChangeNotice(to: Addressee, { email }: { readonly email: string }): Letter {
  return {
    subject: "Your e-mail address is about to change",
    greeting: hello(to),
    paragraphs: [
      `Your account was asked to use the address ${email} from now on. It counts once it is confirmed there.`,
    ],
    closing: ["If that was not you, change your password at once and tell an administrator."],
  };
}

export function passwordChangedNotice(to: Addressee, { at }: { readonly at: number }): Letter {
  return {
    subject: "Your password was changed",
    greeting: hello(to),
    paragraphs: [
      `The password of your account was changed on ${momentText(at)}. Other devices were signed out.`,
    ],
    closing: ["If that was not you, have a link for a new password sent to you, and tell an administrator."],
  };
}

export function newDeviceLetter(
  to: Addressee,
  session: { readonly client: string; readonly address: string; readonly at: number; readonly url: string },
): Letter {
  return {
    subject: "Sign-in from a new device",
    greeting: hello(to),
    paragraphs: [
      `Your account was signed in with ${session.client} from the address ${session.address} on ${momentText(session.at)}. This browser was not seen before.`,
    ],
    action: { label: "See your sessions", url: session.url },
    closing: ["If that was not you, end the session there and change your password."],
  };
}

interface KeyNamed {
  readonly key: string;
  readonly team: string;
  readonly url: string;
}

/** `leftMs` is the time until the key ends, 0 or less once it has. */
export function keyExpiryLetter(
  to: Addressee,
  { key, team, url, leftMs, expiresAt }: KeyNamed & { readonly leftMs: number; readonly expiresAt: number },
): Letter {
  const over = leftMs <= 0;
  return {
    subject: `The key "${key}" ${expiryText(leftMs)}`,
    greeting: hello(to),
    paragraphs: [
      over
        ? `The key "${key}" of the team ${team} expired on ${momentText(expiresAt)}. Calls with it are refused.`
        : `The key "${key}" of the team ${team} expires on ${momentText(expiresAt)}. Calls with it are refused from then on.`,
      "Issue a new key and give it to the programs that use this one.",
    ],
    action: { label: "Open the key", url },
    closing: ["You get this because you look after keys of the team."],
  };
}

/** Percent used: 80 or 100. */
export function quotaLetter(
  to: Addressee,
  {
    key,
    team,
    url,
    percent,
    used,
    quota,
    resetsAt,
  }: KeyNamed & {
    readonly percent: 80 | 100;
    readonly used: number;
    readonly quota: number;
    readonly resetsAt: number;
  },
): Letter {
  const all = percent === 100;
  const numbers = `${used.toLocaleString("en")} of ${quota.toLocaleString("en")} computations`;
  return {
    subject: all
      ? `The key "${key}" has used up its month`
      : `The key "${key}" has used ${percent} % of its month`,
    greeting: hello(to),
    paragraphs: [
      `The key "${key}" of the team ${team} has used ${numbers} of this month.`,
      all
        ? `Its calls are refused until ${momentText(resetsAt)}, unless its quota is raised.`
        : `The count starts anew on ${momentText(resetsAt)}.`,
    ],
    action: { label: "Open the key", url },
    closing: ["You get this because you look after keys of the team."],
  };
}

export function testLetter(to: Addressee): Letter {
  return {
    subject: "A test mail",
    greeting: hello(to),
    paragraphs: ["Mails of this service arrive: nothing else is to be done."],
    closing: ["An administrator asked for it in the settings."],
  };
}
