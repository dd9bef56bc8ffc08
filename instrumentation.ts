/** Next calls this once in each server process, before it answers. */
export async function register() {
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { startUp } = await import('@/lib/start-up');
    await startUp();
  }
}
