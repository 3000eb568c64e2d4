import { useState } from 'react';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { TextAreaField } from '#client/ui/text-field.tsx';

/** What most often goes wrong at a hot wire or a laser; a press takes the word. */
const COMMON = ['wire broke', 'wrong origin', 'surface burnt', 'foam has a void', 'dropped'] as const;

interface ScrapDialogProps {
  readonly what: string;
  readonly onScrap: (reason: string) => void;
  readonly onClose: () => void;
}

/** Asks why a part is scrapped; the builder reads it. */
export function ScrapDialog({ what, onScrap, onClose }: ScrapDialogProps) {
  const [reason, setReason] = useState('');
  const [error, setError] = useState<string>();
  const scrap = () => {
    if (reason.trim() === '') {
      setError('Say why the part is scrapped.');
      return;
    }
    onScrap(reason.trim());
    onClose();
  };
  return (
    <Dialog
      title={`Scrapped: ${what}`}
      onClose={onClose}
      actions={
        <>
          <Button size="large" onClick={onClose}>
            Cancel
          </Button>
          <Button size="large" variant="danger" onClick={scrap}>
            Log as scrapped
          </Button>
        </>
      }
    >
      <div className="flex flex-col gap-3">
        <TextAreaField
          label="Why"
          required
          maxLength={500}
          value={reason}
          error={error}
          onChange={(event) => {
            setReason(event.target.value);
            setError(undefined);
          }}
        />
        <div className="flex flex-wrap gap-2">
          {COMMON.map((word) => (
            <Button key={word} size="large" onClick={() => setReason(word)}>
              {word}
            </Button>
          ))}
        </div>
      </div>
    </Dialog>
  );
}
