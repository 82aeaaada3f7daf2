import path from "node:path";
import compression from "compression";
import express, { type Express, type RequestHandler } from "express";
import { clientAddressHeader } from "#app/services/client-address.server.ts";

export interface WebServerOptions {
  /** Answers whatever is not a file. */
  handler: RequestHandler;
  /** The browser's part of the build: hashed files under assets/, others beside it. */
  clientFolder: string;
  /** How many proxies in front add themselves to X-Forwarded-For; only they are believed. */
  trustProxy: number;
}

/**
 * What react-router-serve does, and what it cannot: it tells the app from which address somebody asks, which limits on guessing need,
 * it believes just the proxies one names, and it writes no addresses of pages to the log.
 */
export function createWebServer({ handler, clientFolder, trustProxy }: WebServerOptions): Express {
  const server = express();
  server.disable("x-powered-by");
  server.set("trust proxy", trustProxy);
  server.use(compression());
  const headers = {
    setHeaders: (response: { setHeader(name: string, value: string): void }) =>
      response.setHeader("X-Content-Type-Options", "nosniff"),
  };
  // A name in assets/ holds the hash of its content, so it never changes.
  server.use(
    "/assets",
    express.static(path.join(clientFolder, "assets"), {
      immutable: true,
      maxAge: "1y",
      fallthrough: false,
      ...headers,
    }),
  );
  server.use(express.static(clientFolder, { maxAge: "1h", index: false, redirect: false, ...headers }));
  server.use((request, _response, next) => {
    request.headers[clientAddressHeader.toLowerCase()] = request.ip ?? "unknown";
    next();
  });
  server.all("*", handler);
  return server;
}
