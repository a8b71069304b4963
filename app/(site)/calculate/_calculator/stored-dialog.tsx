import { Button, ButtonLink } from "../../../_ui/button";
import { Dialog } from "../../../_ui/dialog";

/** What was stored, and for whom. */
export interface StoredRecord {
  readonly label: string;
  readonly team: string;
  /** Null while a field solution is still on its way. */
  readonly id: string | null;
  /** As it stands on the printed sheet; null where it could not be asked for. */
  readonly code: string | null;
}

interface StoredDialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly stored: StoredRecord;
}

/** What was stored, whose it is, and where. */
export function StoredDialog({ open, onOpenChange, stored }: StoredDialogProps) {
  const { label, team, id, code } = stored;
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={id ? "The record is saved" : "The record is on its way"}
      description={
        id
          ? `“${label}” keeps the request, the answer and all versions.`
          : `“${label}” is stored once the field is solved; it then stands among the records of the team ${team}.`
      }
      actions={
        <>
          <Button onClick={() => onOpenChange(false)}>Go on here</Button>
          <ButtonLink href={id ? `/records/${id}` : "/console/records"} variant="primary" prefetch={false}>
            {id ? "Open the record" : "Open the records"}
          </ButtonLink>
        </>
      }
    >
      {id ? (
        <dl className="grid grid-cols-[auto_1fr] gap-x-2 gap-y-0.5 text-table" data-testid="stored">
          <dt className="text-ink-soft">Record</dt>
          <dd>
            <a className="link font-mono" href={`/records/${id}`}>
              {code ?? label}
            </a>
          </dd>
          <dt className="text-ink-soft">Team</dt>
          <dd>{team}</dd>
          <dt className="text-ink-soft">Sheet as PDF</dt>
          <dd className="flex gap-x-2">
            <a className="link" href={`/records/${id}/sheet.pdf?paper=a4`}>
              A4
            </a>
            <a className="link" href={`/records/${id}/sheet.pdf?paper=letter`}>
              Letter
            </a>
          </dd>
        </dl>
      ) : (
        <p className="text-table">It needs nothing more from this page.</p>
      )}
    </Dialog>
  );
}
