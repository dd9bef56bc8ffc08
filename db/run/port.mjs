import net from 'node:net';

/** Whether nobody listens on a port of this machine, as far as binding it for a moment can tell. */
export function portIsFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const probe = net.createServer();
    probe.once('error', () => resolve(false));
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/** The first free port from the preferred one on. */
export async function freePort(preferred, host = '127.0.0.1') {
  for (let port = preferred; port < preferred + 200; port++) {
    if (await portIsFree(port, host)) return port;
  }
  throw new Error(`No free port between ${preferred} and ${preferred + 199}.`);
}
