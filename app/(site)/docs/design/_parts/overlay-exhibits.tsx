"use client";

import { useState } from "react";
import { Button } from "../../../../_ui/button";
import { Dialog } from "../../../../_ui/dialog";
import { Help } from "../../../../_ui/help";
import { LiveRegion } from "../../../../_ui/live-region";
import { Tabs } from "../../../../_ui/tabs";
import { ToastArea, useToast } from "../../../../_ui/toast";
import { Exhibit } from "./exhibit";

/** What opens, appears or takes turns: help, dialogs, messages, tabs. */
export function OverlayExhibits() {
  return (
    <ToastArea>
      <Overlays />
    </ToastArea>
  );
}

function Overlays() {
  const [asking, setAsking] = useState(false);
  const [removed, setRemoved] = useState(0);
  const toast = useToast();
  return (
    <>
      <Exhibit
        title="Help, dialogs, messages"
        note="Help opens on a press, also by touch; a dialog keeps focus inside and returns it; a message is read out and can be undone."
      >
        <div className="flex flex-wrap items-center gap-1.5">
          <span className="inline-flex items-center gap-1 text-table">
            Lay factor <Help about="Lay factor" text="Length of a strand over the length of the conductor." />
          </span>
          <Button variant="danger" onClick={() => setAsking(true)}>
            Remove a thing
          </Button>
          <Button
            onClick={() =>
              toast("The thing was renamed.", { undo: () => toast("The thing has its old name again.") })
            }
          >
            Show a message
          </Button>
        </div>
        <Dialog
          open={asking}
          onOpenChange={setAsking}
          title="Remove this thing?"
          description="Two other things refer to it and would stop working."
          actions={
            <>
              <Button onClick={() => setAsking(false)}>Keep it</Button>
              <Button
                variant="danger"
                onClick={() => {
                  setAsking(false);
                  setRemoved(removed + 1);
                  toast("The thing was removed.");
                }}
              >
                Remove it
              </Button>
            </>
          }
        >
          <p className="text-table">What a dialog says fits a few lines; longer content scrolls.</p>
        </Dialog>
        <LiveRegion text={removed > 0 ? `${removed} removed` : ""} />
      </Exhibit>
      <Exhibit title="Tabs" note="Arrow keys move between them.">
        <Tabs
          label="Languages"
          tabs={["One", "Two", "Three"].map((label) => ({
            id: label,
            label,
            content: <p className="text-table">Content of tab {label.toLowerCase()}.</p>,
          }))}
        />
      </Exhibit>
    </>
  );
}
