/** Copies a text and says so, or says what to copy by hand. */
export async function copyText(what: string, value: string): Promise<string> {
  try {
    await navigator.clipboard.writeText(value);
    return `Copied ${what}.`;
  } catch {
    return `The browser did not let this page copy. Here it is: ${value}`;
  }
}
