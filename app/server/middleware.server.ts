import { randomBytes, randomUUID } from "node:crypto";
import type { MiddlewareFunction } from "react-router";
import { appDb } from "#app/services/db.server.ts";
import { env } from "#app/services/env.server.ts";
import { log } from "#app/services/log.server.ts";
import { appMailer } from "#app/services/mail.server.ts";
import { appPlanner } from "#app/services/planner.server.ts";
import { appRingReader } from "#app/services/ring-reader.server.ts";
import { appStorage } from "#app/services/storage.server.ts";
import { contentSecurityPolicy } from "./content-security-policy.server.ts";
import {
  dbContext,
  logContext,
  mailerContext,
  nonceContext,
  plannerContext,
  ringReaderContext,
  storageContext,
} from "./context.server.ts";

/** One line a request, without personal data: what was asked, how it ended, how long it took. */
export const requestLog: MiddlewareFunction<Response> = async ({ request, context, pattern }, next) => {
  const requestLog = log().child({ request: randomUUID().slice(0, 8) });
  context.set(logContext, requestLog);
  const began = performance.now();
  const response = await next();
  requestLog.info(
    { method: request.method, route: pattern, status: response.status, ms: Math.round(performance.now() - began) },
    "request",
  );
  return response;
};

/** Puts the process's database, file store, mailer, ring reader and planner within reach of loaders and actions. Tests set their own before the root runs. */
export const outside: MiddlewareFunction<Response> = ({ context }) => {
  context.set(dbContext, appDb());
  context.set(storageContext, appStorage());
  context.set(mailerContext, appMailer());
  context.set(ringReaderContext, appRingReader());
  context.set(plannerContext, appPlanner());
};

/** Headers that every answer carries. Pages are never kept by a cache that others share; files set their own policy. */
export const securityHeaders: MiddlewareFunction<Response> = async ({ context }, next) => {
  const nonce = randomBytes(16).toString("base64");
  context.set(nonceContext, nonce);
  const response = await next();
  const { headers } = response;
  // A file handed out has a stricter one of its own.
  if (!headers.has("Content-Security-Policy"))
    headers.set("Content-Security-Policy", contentSecurityPolicy(nonce, env()));
  headers.set("Referrer-Policy", "same-origin");
  headers.set("X-Content-Type-Options", "nosniff");
  headers.set("Permissions-Policy", "camera=(self), microphone=(), geolocation=()");
  if (!headers.has("Cache-Control")) headers.set("Cache-Control", "private, no-cache");
  if (env().PUBLIC_URL.startsWith("https:")) headers.set("Strict-Transport-Security", "max-age=31536000");
  return response;
};
