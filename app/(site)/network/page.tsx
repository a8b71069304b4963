import type { Metadata } from "next";
import { catalogue } from "@/lib/engine";
import { sharedService } from "@/lib/service/service";
import { savingFor } from "../calculate/_server/saving";
import { firstSolution } from "./_server/first-solution";
import { NetworkPage } from "./_network/network-page";

export const metadata: Metadata = {
  title: "Network",
  description:
    "The whole current path: elements between nodes, the resistance between two of them, and where the loss is.",
};

export default async function Network() {
  return (
    <NetworkPage
      heading={
        <>
          <h1>Network</h1>
          <p className="mt-0.5 max-w-prose text-ink-soft">
            The whole current path: elements between nodes, the resistance between two of them, and where the
            loss is.
          </p>
        </>
      }
      shapes={catalogue.map(({ id, title }) => ({ id, title }))}
      first={firstSolution()}
      origin={sharedService().config.origin}
      saving={await savingFor("/network")}
    />
  );
}
