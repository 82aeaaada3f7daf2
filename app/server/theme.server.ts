import { createCookie } from "react-router";

/** How this browser wants the shop lit; "system" follows the device. Not secret, so unsigned. */
const cookie = createCookie("theme", { path: "/", sameSite: "lax", maxAge: 31_536_000 });

export type Theme = "light" | "dark" | "system";

/** The chosen scheme, or undefined to follow the device. */
export async function readTheme(request: Request): Promise<"light" | "dark" | undefined> {
  const value = await cookie.parse(request.headers.get("Cookie"));
  return value === "light" || value === "dark" ? value : undefined;
}

/** The Set-Cookie header that keeps a choice. */
export function keepTheme(theme: Theme): Promise<string> {
  return cookie.serialize(theme);
}
