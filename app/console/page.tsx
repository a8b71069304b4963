import { redirect } from "next/navigation";

/** The first thing to see. */
export default function Console(): never {
  redirect("/console/account");
}
