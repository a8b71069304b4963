import type { Metadata } from "next";
import { requireSession } from "../_shell/require-session";
import { AccountPage } from "./_parts/account-page";

export const metadata: Metadata = { title: "My account" };

export default async function Account() {
  await requireSession("account.manage");
  return <AccountPage />;
}
