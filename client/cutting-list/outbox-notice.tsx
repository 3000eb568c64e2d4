import { Button } from '#client/ui/button.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { type OutboxEntry } from './outbox.ts';

interface OutboxNoticeProps {
  readonly entries: readonly OutboxEntry[];
  readonly onDismiss: (key: string) => void;
}

/** What has not reached the server: it is kept and sent by itself; what was refused is said with the reason. */
export function OutboxNotice({ entries, onDismiss }: OutboxNoticeProps) {
  const waiting = entries.filter(({ refusal }) => refusal === null).length;
  const refused = entries.filter(({ refusal }) => refusal !== null);
  return (
    <>
      {waiting > 0 && (
        <Notice tone="caution" className="text-base">
          {waiting === 1 ? 'One entry waits' : `${String(waiting)} entries wait`} for the network. Nothing is
          lost: it is sent by itself, once.
        </Notice>
      )}
      {refused.map(({ log, refusal }) => (
        <Notice key={log.key} tone="error" className="flex flex-wrap items-center gap-x-4 gap-y-2 text-base">
          <span>
            The entry "{log.part} {log.action}" was not taken: {refusal}
          </span>
          <Button size="large" onClick={() => onDismiss(log.key)}>
            Understood
          </Button>
        </Notice>
      ))}
    </>
  );
}
