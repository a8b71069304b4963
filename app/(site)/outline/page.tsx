import type { Metadata } from "next";
import { sharedService } from "@/lib/service/service";
import { materialChoices } from "../calculate/_server/material-choices";
import { readerMaterials } from "../calculate/_server/reader-materials";
import { savingFor } from "../calculate/_server/saving";
import { startSketch } from "./_model/start-outlines";
import { KEPT_QUERY } from "./_model/address";
import { OutlinePage } from "./_outline/outline-page";

export const metadata: Metadata = {
  title: "Outline",
  description: "Draw any outline, name its terminals and bracket its resistance between two field solutions.",
};

const START_C = 20;
const START = startSketch("bend");

export default async function Outline() {
  return (
    <OutlinePage
      heading={
        <>
          <h1>Outline</h1>
          <p className="mt-0.5 max-w-prose text-ink-soft">
            Any shape with holes and arcs, as a sheet or about an axis: draw it, make edges terminals, and
            solve for a resistance between two proved bounds.
          </p>
        </>
      }
      start={START}
      materials={materialChoices((await readerMaterials()).all, START_C)}
      origin={sharedService().config.origin}
      saving={await savingFor(`/outline?${KEPT_QUERY}`)}
    />
  );
}
