import type { Letter } from "#app/services/mail.server.ts";
import { challengeMinutes } from "./challenges.server.ts";

function htmlText(text: string): string {
  return text.replaceAll("&", "&amp;").replaceAll("<", "&lt;").replaceAll(">", "&gt;").replaceAll('"', "&quot;");
}

function page(paragraphs: string[]): string {
  return `<div style="font-family:sans-serif;font-size:16px;line-height:1.5;color:#1b211f">${paragraphs.map((text) => `<p>${text}</p>`).join("")}</div>`;
}

/** The letter with a sign-in code and link. */
export function signInLetter(to: string, code: string, link: string): Letter {
  const spaced = `${code.slice(0, 3)} ${code.slice(3)}`;
  return {
    to,
    subject: `${code} is your Rayfleck code`,
    text: `Your sign-in code is ${code}.\n\nOr open this and press the button there:\n${link}\n\nBoth are good for ${challengeMinutes} minutes and once. If you did not ask for them, leave this letter be: nobody is signed in without them.\n`,
    html: page([
      `Your sign-in code is <strong style="font-size:24px;letter-spacing:2px">${spaced}</strong>`,
      `Or <a href="${htmlText(link)}">open this page</a> and press the button there.`,
      `Both are good for ${challengeMinutes} minutes and once. If you did not ask for them, leave this letter be: nobody is signed in without them.`,
    ]),
  };
}

/** The letter that asks somebody into a shop. */
export function invitationLetter(
  to: string,
  invitation: { by: string; shop: string; role: string; link: string },
): Letter {
  const { by, shop, role, link } = invitation;
  return {
    to,
    subject: `${by} asks you into ${shop} on Rayfleck`,
    text: `${by} asks you into the shop ${shop}, as ${role}.\n\nOpen this to accept:\n${link}\n\nIt is good for two weeks.\n`,
    html: page([
      `${htmlText(by)} asks you into the shop <strong>${htmlText(shop)}</strong>, as ${htmlText(role)}.`,
      `<a href="${htmlText(link)}">Open this page to accept</a>. It is good for two weeks.`,
    ]),
  };
}
