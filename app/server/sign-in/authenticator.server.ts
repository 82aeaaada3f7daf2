import { createHash } from "node:crypto";
import type { Knex } from "knex";
import { redirect } from "react-router";
import { Authenticator } from "remix-auth";
import { TOTPStrategy } from "remix-auth-totp";
import { env } from "#app/services/env.server.ts";
import type { Mailer } from "#app/services/mail.server.ts";
import { challengeMinutes, consumeCode, openChallenge } from "./challenges.server.ts";
import { finishSignIn } from "./finish.server.ts";
import { signInLetter } from "./letters.server.ts";
import { forgetPending, keepPending, type Pending, readPending } from "./pending.server.ts";

const name = "code";

interface SignInServices {
  db: Knex;
  mailer: Mailer;
  now: Date;
}

/**
 * The flow of a sign-in by mailed code, from remix-auth-totp. The library is not the judge: its cookie is unsigned, its code is not bound to an address
 * and works twice. Our challenge row decides in `verify`, for exactly the address and code, once; and guesses are counted before it is asked.
 */
function authenticator(
  { db, mailer, now }: SignInServices,
  begin: { to: string; onOpened: (pending: Pending) => void },
  faults: unknown[],
) {
  const secure = env().PUBLIC_URL.startsWith("https:") ? (true as const) : undefined;
  const strategy = new TOTPStrategy<never>(
    {
      // 64 hexadecimal digits are what the library wants of a key.
      secret: secretKey(),
      totpGeneration: { digits: 6, charSet: "0123456789", period: challengeMinutes * 60 },
      cookieOptions: { httpOnly: true, path: "/sign-in", sameSite: "Lax", secure, maxAge: challengeMinutes * 60 },
      emailSentRedirect: "/sign-in/code",
      successRedirect: "/",
      failureRedirect: "/sign-in/code?wrong",
      async sendTOTP({ email, code }) {
        await noting(faults, async () => {
          const { id, token } = await openChallenge(db, email, code, now);
          const link = `${env().PUBLIC_URL}/sign-in/link?${new URLSearchParams({ t: token, to: begin.to })}`;
          await mailer.send(signInLetter(email, code, link));
          begin.onOpened({ challengeId: id, email, to: begin.to });
        });
      },
    },
    ({ email, formData, request }) =>
      noting(faults, async () => {
        const pending = await readPending(request);
        const code = String(formData?.get("code") ?? "");
        const right =
          pending !== null &&
          pending.email === email &&
          (await consumeCode(db, { id: pending.challengeId, email, code }, now));
        if (!right) throw redirect("/sign-in/code?wrong");
        const done = await finishSignIn(db, request, email, pending.to, now);
        done.headers.append("Set-Cookie", await forgetPending());
        throw done;
      }),
  );
  return new Authenticator<never>().use(strategy, name);
}

/** The library takes every error for a wrong code. Ours are put aside, to be thrown once it has answered. */
async function noting<T>(faults: unknown[], work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    if (!(error instanceof Response)) faults.push(error);
    throw error;
  }
}

/** A key for the library's own cookie, made from the first session secret so that there is one secret to keep. */
function secretKey(): string {
  return createHash("sha256").update(`totp ${env().SESSION_SECRETS[0]}`).digest("hex");
}

/** Mails a code to an address, trimmed and in lower case. @returns the answer: off to the page where the code is typed. @throws when the letter cannot be sent. */
export async function mailCode(
  services: SignInServices,
  request: Request,
  email: string,
  to: string,
): Promise<Response> {
  let opened: Pending | undefined;
  const asked = new Request(request.url, { method: "POST", body: new URLSearchParams({ email }) });
  const onOpened = (pending: Pending) => {
    opened = pending;
  };
  const answer = await answerOf((faults) =>
    authenticator(services, { to, onOpened }, faults).authenticate(name, asked),
  );
  if (opened) answer.headers.append("Set-Cookie", await keepPending(opened));
  return answer;
}

/** Judges a code that was typed. @returns a redirect: into the shop with a session, or back to the page with `?wrong`. */
export async function judgeCode(services: SignInServices, request: Request, code: string): Promise<Response> {
  const asked = new Request(request.url, {
    method: "POST",
    body: new URLSearchParams({ code }),
    headers: { Cookie: request.headers.get("Cookie") ?? "", "User-Agent": request.headers.get("User-Agent") ?? "" },
  });
  return answerOf((faults) =>
    authenticator(services, { to: "/", onOpened: () => {} }, faults).authenticate(name, asked),
  );
}

/** The library answers by throwing. Its answers' headers are made writable; a fault of ours is thrown as it was. */
async function answerOf(run: (faults: unknown[]) => Promise<unknown>): Promise<Response> {
  const faults: unknown[] = [];
  const answer = await run(faults).catch((thrown: unknown) => thrown);
  if (faults.length > 0) throw faults[0];
  if (!(answer instanceof Response))
    throw answer instanceof Error ? answer : new Error("the sign-in library gave no answer");
  return new Response(answer.body, { status: answer.status, headers: new Headers(answer.headers) });
}
