import { Dialog } from '#client/ui/dialog.tsx';
import { type KeyGroup, useKeyGroups } from './keys.tsx';

const EVERYWHERE: KeyGroup = {
  title: 'Everywhere',
  entries: [
    { keys: ['?'], does: 'Show these keys' },
    { keys: ['Tab'], does: 'To the next control' },
    { keys: ['Esc'], does: 'Close, or take back what is being typed' },
  ],
};

export function KeysDialog({ onClose }: { onClose: () => void }) {
  const groups = [...useKeyGroups(), EVERYWHERE];
  return (
    <Dialog title="Keys" onClose={onClose} light>
      <div className="flex flex-col gap-5">
        {groups.map((group) => (
          <section key={group.title}>
            <h3 className="mb-1 border-b border-rule pb-1 text-xs font-semibold text-graphite">
              {group.title}
            </h3>
            <dl>
              {group.entries.map((entry) => (
                <div key={entry.does} className="flex items-center gap-3 py-1">
                  <dt className="flex w-36 shrink-0 flex-wrap gap-1">
                    {entry.keys.map((key) => (
                      <kbd key={key} className="rounded border border-edge bg-sheet px-1.5 text-xs">
                        {key}
                      </kbd>
                    ))}
                  </dt>
                  <dd>{entry.does}</dd>
                </div>
              ))}
            </dl>
          </section>
        ))}
      </div>
    </Dialog>
  );
}
