/** The mark: a section's outline crossed by the wire that cuts it. public/mark.svg is the same drawing. */
export function Mark({ className = 'h-5 w-9' }: { className?: string | undefined }) {
  return (
    <svg viewBox="0 0 36 20" className={`fill-none stroke-[1.8] ${className}`} aria-hidden="true">
      <path
        d="M2 11.5C2 6.5 8 5 13.5 5 21.5 5 29 8.6 34 11 27.5 12.9 20 14.6 12.5 14.6 6.5 14.6 2 14 2 11.5Z"
        className="stroke-current"
        strokeLinejoin="round"
      />
      <path d="M12 1.2V18.8" className="stroke-wire" strokeLinecap="round" />
    </svg>
  );
}
