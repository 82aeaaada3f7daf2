import { createServer } from "node:net";

/** A port that nothing on this machine listens to at the moment. */
export async function freePort(): Promise<number> {
  const port = await tryPort(0);
  if (port === null) throw new Error("This machine has no free port left.");
  return port;
}

/** May a server listen here? */
export async function isPortFree(port: number, host = "127.0.0.1"): Promise<boolean> {
  return (await tryPort(port, host)) !== null;
}

/** The wanted port if it is free, else any. */
export async function portNear(wanted: number, host = "127.0.0.1"): Promise<number> {
  return (await isPortFree(wanted, host)) ? wanted : freePort();
}

function tryPort(port: number, host = "127.0.0.1"): Promise<number | null> {
  return new Promise((resolve) => {
    const server = createServer();
    server.once("error", () => resolve(null));
    server.listen({ port, host, exclusive: true }, () => {
      const address = server.address();
      server.close(() => resolve(typeof address === "object" && address ? address.port : null));
    });
  });
}
