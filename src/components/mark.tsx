export interface MarkProps {
  className?: string;
}

/** The bell, one half in shade, its clapper lit. Decorative: the word Duskbell always stands beside it. Made for dusk. */
export function Mark({ className = "h-7 w-[26px]" }: MarkProps) {
  return (
    <svg viewBox="0 0 26 28" aria-hidden="true" className={className}>
      <path
        d="M13 1.5c.9 0 1.6.7 1.6 1.6v.7C18.7 4.6 21 8 21 12.2v4.6l3 4.2v1.5H2V21l3-4.2v-4.6C5 8 7.3 4.6 11.4 3.8v-.7c0-.9.7-1.6 1.6-1.6z"
        fill="#8593c9"
      />
      <path d="M13 3.6c4.8 0 8 3.8 8 8.6v4.6l3 4.2v1.5H13z" fill="#fbf6ec" />
      <path d="M9.6 24.3h6.8a3.4 3.4 0 0 1-6.8 0z" fill="#f6b13d" />
    </svg>
  );
}
