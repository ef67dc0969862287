/** The name mark: a tilt against level, with the angle between. */
export function Mark() {
  return (
    <svg viewBox="0 0 34 22" width="34" height="22" aria-hidden="true" className="flex-none">
      <path d="M1 20H33M1 20L31 9" fill="none" stroke="currentColor" strokeWidth="1.6" />
      <path d="M22 20A21 21 0 0 0 20.7 12.8" fill="none" className="stroke-rust" strokeWidth="1.8" />
    </svg>
  );
}
