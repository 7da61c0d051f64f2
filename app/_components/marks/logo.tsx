/** A tile in its bed; the tail of the Q is the tile in hand. */
export function Logo() {
  return (
    <svg viewBox="0 0 48 48" aria-hidden="true" focusable="false">
      <path fill="var(--ink)" fillRule="evenodd" d="M2 2h44v23h-5V7H7v34h18v5H2z" />
      <path fill="var(--ink)" d="M11 11h26v14H25v12H11z" />
      <path fill="var(--clay)" d="M28 28h18v18H28z" />
    </svg>
  );
}
