/** What pointer events say of themselves; React's stand-ins for them say it too. */
type MaybePointer = Pick<Event, 'type'> & Partial<Pick<PointerEvent, 'pointerType' | 'isPrimary'>>;

/** A finger put down while another is: it belongs to a gesture of two on the paper, wherever it lands. */
export function isSecondFinger({ pointerType, isPrimary }: MaybePointer): boolean {
  return pointerType === 'touch' && isPrimary === false;
}
