import { type ReactNode } from 'react';

const TONES = {
  good: 'border-spruce text-spruce',
  caution: 'border-amber text-amber',
  error: 'border-brick text-brick',
} as const;

/** What came of an action, in place and lasting: never a passing message. An error is announced at once. */
export function Notice({
  tone,
  children,
  className = '',
}: {
  tone: keyof typeof TONES;
  children: ReactNode;
  className?: string | undefined;
}) {
  return (
    <div
      role={tone === 'error' ? 'alert' : 'status'}
      className={`border-l-2 pl-3 ${TONES[tone]} ${className}`}
    >
      {children}
    </div>
  );
}
