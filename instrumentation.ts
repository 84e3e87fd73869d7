/** Called once when a server process starts, before it takes requests. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== 'nodejs') return;
  const { startServer } = await import('./lib/use-cases/start-server');
  await startServer();
}
