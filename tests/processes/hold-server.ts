import { createServer, type IncomingMessage } from "node:http";
import { pino } from "pino";
import { createStaticHandler, RouterContextProvider, type StaticHandlerContext } from "react-router";
import { action as reserve } from "#app/routes/boards/reserve.tsx";
import { action as changeState } from "#app/routes/boards/state.ts";
import { action as changeHold } from "#app/routes/holds/hold.ts";
import { requireAtWork } from "#app/server/at-work.server.ts";
import { dbContext, logContext } from "#app/server/context.server.ts";
import { findVisitor } from "#app/server/visit.server.ts";
import { createDb } from "#app/services/db.server.ts";

/**
 * A web server of the app's own, with a pool of its own, that answers what two people can meet at: the real session, guard and actions, without pages,
 * so that no build is needed. Its database is the argument. It tells its port to whoever started it, and ends with them.
 */
const db = createDb(process.argv[2] ?? "");
const log = pino({ level: "silent" });

const outside = ({ context }: { context: Readonly<RouterContextProvider> }) => {
  context.set(dbContext, db);
  context.set(logContext, log);
};

const handler = createStaticHandler([
  {
    id: "root",
    path: "/",
    middleware: [outside, findVisitor, requireAtWork] as never,
    children: [
      { id: "reserve", path: "boards/:boardId/reserve", action: reserve as never },
      { id: "state", path: "boards/:boardId/state", action: changeState as never },
      { id: "hold", path: "holds/:holdId", action: changeHold as never },
    ],
  },
]);

async function answer(request: Request): Promise<Response> {
  const answered = await handler.query(request, {
    requestContext: new RouterContextProvider(),
    generateMiddlewareResponse: async (query) => asResponse(await query(request)),
  });
  return asResponse(answered);
}

/** What the page would be drawn from, as JSON. */
function asResponse(answered: Response | StaticHandlerContext): Response {
  if (answered instanceof Response) return answered;
  const { statusCode, actionData, errors } = answered;
  const data = Object.values(actionData ?? errors ?? {})[0];
  return Response.json(data instanceof Error ? { error: data.message } : data, { status: statusCode });
}

async function toRequest(incoming: IncomingMessage): Promise<Request> {
  const chunks: Uint8Array[] = [];
  for await (const chunk of incoming) chunks.push(chunk);
  return new Request(`http://${incoming.headers.host}${incoming.url}`, {
    method: incoming.method,
    headers: new Headers(incoming.headers as Record<string, string>),
    body: Buffer.concat(chunks),
  });
}

const server = createServer(async (incoming, outgoing) => {
  const response = await answer(await toRequest(incoming));
  outgoing.writeHead(response.status, Object.fromEntries(response.headers));
  outgoing.end(await response.text());
});
server.listen(0, "127.0.0.1", () => {
  const address = server.address();
  process.send?.({ port: typeof address === "object" ? address?.port : null });
});
process.on("disconnect", () => process.exit(0));
