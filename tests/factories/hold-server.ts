import { fork } from "node:child_process";
import { once } from "node:events";
import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { startSession } from "#app/server/session.server.ts";

export interface HoldServer {
  /** Presses a button: posts a form as somebody signed in. Answers the status and what the page would be drawn from. */
  press(path: string, cookie: string, form: Record<string, string>): Promise<{ status: number; data: unknown }>;
  stop(): Promise<void>;
}

/** Starts one more web process on a database. */
export async function startHoldServer(databaseUrl: string): Promise<HoldServer> {
  const child = fork("tests/processes/hold-server.ts", [databaseUrl], { execArgv: ["--import", "tsx"] });
  const [message] = await Promise.race([
    once(child, "message"),
    once(child, "exit").then(([code]) => Promise.reject(new Error(`the web process ended at once (${code})`))),
  ]);
  const base = `http://127.0.0.1:${(message as { port: number }).port}`;
  return {
    async press(path, cookie, form) {
      const answer = await fetch(base + path, {
        method: "POST",
        redirect: "manual",
        headers: { Cookie: cookie },
        body: new URLSearchParams(form),
      });
      const text = await answer.text();
      return { status: answer.status, data: text === "" ? null : JSON.parse(text) };
    },
    async stop() {
      const ended = once(child, "exit");
      child.disconnect();
      await ended;
    },
  };
}

/** The cookie of somebody who has signed in and is in their shop. */
export async function signedIn(db: Knex, actor: Actor): Promise<string> {
  const session = { personId: actor.personId, shopId: actor.shopId };
  const line = await startSession(db, new Request("http://rack.example"), session, new Date());
  return line.split(";")[0] ?? "";
}
