/** The mark: a bolt head from above with a paint line from the head out onto the part. For dark rails. */
export function Logo({ size = 34 }: { size?: number }) {
  return (
    <svg viewBox="0 0 100 100" width={size} height={size} aria-hidden className="block shrink-0">
      <circle cx="50" cy="52" r="44" fill="none" stroke="var(--deep-soft)" strokeWidth="5" />
      <polygon points="50,20 78,36 78,68 50,84 22,68 22,36" fill="#f6f8f3" />
      <path d="M50 1 V46" stroke="var(--deep-line)" strokeWidth="12" />
    </svg>
  );
}
