/** Runs once when the web server starts, before its first request. */
export async function register(): Promise<void> {
  // Replaced when the server is built: only Node has sockets.
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { noteSocketAddresses } = await import('@/lib/access/client-address');
    noteSocketAddresses();
  }
}
