/** Runs once when the server starts, before it answers anything. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== 'nodejs') return;
  const { prepareServing } = await import('@/lib/http/prepare-serving');
  prepareServing();
}
