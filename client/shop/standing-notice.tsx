import { Button } from '#client/ui/button.tsx';
import { Moment } from '#client/ui/moment.tsx';

export interface StandingNoticeProps {
  who: string;
  at: string;
  /** What stands there now where it is other than in the form: "Largest feed: 900 mm/min". */
  differences: readonly string[];
  onTakeTheirs: () => void;
  onSaveMine: () => void;
  busy: boolean;
}

/** Somebody changed this in between. Nothing is lost: what differs is shown, and the person decides. */
export function StandingNotice(props: StandingNoticeProps) {
  const { who, at, differences, onTakeTheirs, onSaveMine, busy } = props;
  return (
    <div role="alert" className="border-l-2 border-amber pl-3">
      <p>
        {who} changed this in between (<Moment at={at} />
        ). Nothing was overwritten, and what you typed is kept.
      </p>
      {differences.length > 0 && (
        <>
          <p className="mt-1">There it now says:</p>
          <ul className="list-inside list-disc">
            {differences.map((difference) => (
              <li key={difference}>{difference}</li>
            ))}
          </ul>
        </>
      )}
      <div className="mt-2 flex flex-wrap gap-2">
        <Button onClick={onTakeTheirs}>Take what is there</Button>
        <Button onClick={onSaveMine} busy={busy}>
          Save mine over it
        </Button>
      </div>
    </div>
  );
}
