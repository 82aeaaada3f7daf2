import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, beforeEach, expect, it } from "vitest";
import { createMailer, type Mailer } from "#app/services/mail.server.ts";
import { listLetters, newestCode } from "./letters.ts";
import { type FakeMail, startFakeMail } from "./mail.ts";

let folder: string;
let fake: FakeMail;
let mailer: Mailer;

beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), "rayfleck-mail-"));
  fake = await startFakeMail({ folder });
  mailer = createMailer({ SMTP_URL: fake.settings.SMTP_URL, MAIL_FROM: "Rayfleck <shop@example.org>" });
});
afterAll(async () => {
  mailer.close();
  await fake.stop();
  await rm(folder, { recursive: true });
});
beforeEach(async () => {
  // Names of letters are in order to the millisecond.
  await new Promise((resolve) => setTimeout(resolve, 2));
});

it("keeps a letter as it was written", async () => {
  await mailer.send({
    to: "Ines@example.org",
    subject: "Your code",
    text: "Your code is 123456.",
    html: "<b>123456</b>",
  });
  const [letter] = await listLetters(folder);
  expect(letter).toMatchObject({ to: "ines@example.org", subject: "Your code", text: "Your code is 123456." });
  expect(Math.abs(letter!.arrivedAt.getTime() - Date.now())).toBeLessThan(10_000);
});

it("reads signs beyond ASCII, long lines and addresses with a name", async () => {
  const text = `Un été à l'atelier: ${"planche ".repeat(40)}\n\nfin = oui`;
  await mailer.send({ to: "Åsa Björk <asa@example.org>", subject: "Chêne, noyer et érable: ".repeat(5).trim(), text });
  const [letter] = await listLetters(folder);
  expect(letter).toMatchObject({ to: "asa@example.org", subject: "Chêne, noyer et érable: ".repeat(5).trim(), text });
});

it("gives the newest code of one person, and takes no digits out of a link", async () => {
  await mailer.send({ to: "tom@example.org", subject: "Code", text: "111111" });
  await new Promise((resolve) => setTimeout(resolve, 2));
  await mailer.send({
    to: "tom@example.org",
    subject: "Code",
    text: "Open http://localhost/sign-in/999999 or type 222222.",
  });
  await mailer.send({ to: "ann@example.org", subject: "Code", text: "333333" });
  expect(await newestCode(folder, "Tom@example.org")).toBe("222222");
  expect(await newestCode(folder, "nobody@example.org")).toBeNull();
});

it("shows letters on a page, without believing what is in them", async () => {
  await mailer.send({
    to: "eve@example.org",
    subject: "<script>alert(1)</script>",
    text: "see https://example.org/a?b=1&c=2 <b>now</b>",
  });
  const page = await (await fetch(fake.inboxUrl)).text();
  expect(page).toContain("&lt;script&gt;alert(1)&lt;/script&gt;");
  expect(page).toContain('<a href="https://example.org/a?b=1&amp;c=2">');
  expect(page).not.toContain("<b>now</b>");
});
