import { randomBytes } from "node:crypto";
import { mkdir, rename, writeFile } from "node:fs/promises";
import { createServer } from "node:http";
import type { AddressInfo, Server } from "node:net";
import path from "node:path";
import { text } from "node:stream/consumers";
import { SMTPServer } from "smtp-server";
import { inboxPage } from "./inbox-page.ts";
import { letterName, listLetters } from "./letters.ts";

export interface FakeMail {
  /** The settings that lead to it. */
  settings: Record<"SMTP_URL", string>;
  /** A page that shows what arrived, newest first. */
  inboxUrl: string;
  stop(): Promise<void>;
}

/**
 * A mail server that delivers nothing: letters stay in a folder, a file each, and on a small page. On loopback only, as whoever reads it can sign in.
 *
 * @param inboxPort where the page is served; 0 for any.
 */
export async function startFakeMail({
  folder,
  inboxPort = 0,
}: {
  folder: string;
  inboxPort?: number;
}): Promise<FakeMail> {
  await mkdir(folder, { recursive: true });
  const smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ["AUTH", "STARTTLS"],
    async onData(stream, _session, done) {
      try {
        const name = letterName(new Date(), randomBytes(3).toString("hex"));
        // Under another name until it is whole: somebody may be looking.
        await writeFile(path.join(folder, `${name}.part`), await text(stream));
        await rename(path.join(folder, `${name}.part`), path.join(folder, name));
        done();
      } catch (error) {
        done(error as Error);
      }
    },
  });
  const inbox = createServer(async (_request, response) => {
    const page = inboxPage(await listLetters(folder, { atMost: 50 }));
    response.writeHead(200, {
      "Content-Type": "text/html; charset=utf-8",
      "Content-Security-Policy": "default-src 'none'; style-src 'unsafe-inline'",
    });
    response.end(page);
  });
  const smtpPort = await listen(smtp.server, 0);
  const pagePort = await listen(inbox, inboxPort);
  return {
    settings: { SMTP_URL: `smtp://127.0.0.1:${smtpPort}` },
    inboxUrl: `http://localhost:${pagePort}/`,
    async stop() {
      inbox.closeAllConnections();
      await Promise.all([new Promise<void>((done) => smtp.close(done)), new Promise((done) => inbox.close(done))]);
    },
  };
}

function listen(server: Server, port: number): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, "127.0.0.1", () => resolve((server.address() as AddressInfo).port));
  });
}
