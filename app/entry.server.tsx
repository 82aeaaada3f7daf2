import { PassThrough } from "node:stream";
import { createReadableStreamFromReadable } from "@react-router/node";
import { isbot } from "isbot";
import { type RenderToPipeableStreamOptions, renderToPipeableStream } from "react-dom/server";
import {
  type EntryContext,
  type HandleErrorFunction,
  isRouteErrorResponse,
  type RouterContextProvider,
  ServerRouter,
} from "react-router";
import { logContext, nonceContext } from "./server/context.server.ts";

export const streamTimeout = 5_000;

/** Renders a document. The nonce reaches every script and style through ServerRouter and the renderer, and nowhere else. */
export default function handleRequest(
  request: Request,
  status: number,
  headers: Headers,
  routerContext: EntryContext,
  context: RouterContextProvider,
): Promise<Response> | Response {
  if (request.method === "HEAD") return new Response(null, { status, headers });
  const nonce = context.get(nonceContext);
  // Robots read what they are given once: they wait for the whole page.
  const ready: keyof RenderToPipeableStreamOptions = isbot(request.headers.get("user-agent") ?? "")
    ? "onAllReady"
    : "onShellReady";

  return new Promise((resolve, reject) => {
    let shellRendered = false;
    let answerStatus = status;
    const { pipe, abort } = renderToPipeableStream(
      <ServerRouter context={routerContext} url={request.url} nonce={nonce} />,
      {
        nonce,
        [ready]() {
          shellRendered = true;
          const body = new PassThrough();
          headers.set("Content-Type", "text/html; charset=utf-8");
          pipe(body);
          resolve(new Response(createReadableStreamFromReadable(body), { status: answerStatus, headers }));
        },
        onShellError: reject,
        onError(error: unknown) {
          answerStatus = 500;
          if (shellRendered) context.get(logContext).error({ err: error }, "a page broke while it was drawn");
        },
      },
    );
    setTimeout(abort, streamTimeout + 1_000).unref();
  });
}

/** Bugs go to the log once; refusals and requests that the browser gave up do not. */
export const handleError: HandleErrorFunction = (error, { request, context }) => {
  if (request.signal.aborted || isRouteErrorResponse(error)) return;
  context.get(logContext).error({ err: error }, "a request failed");
};
