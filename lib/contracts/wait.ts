/** How long to wait after too many attempts, in words. */
export function waitWords(seconds: number): string {
  const minutes = Math.ceil(seconds / 60);
  const long = seconds > 120 ? ` (${minutes} minutes)` : '';
  return `Too many attempts. Try again in ${seconds} ${seconds === 1 ? 'second' : 'seconds'}${long}.`;
}
