/** The page of the board that a tag's code names, or null for a code that is not one of ours. Only the path counts: a shop may have moved house. */
export function boardPathOf(text: string): string | null {
  if (!URL.canParse(text)) return null;
  const { pathname } = new URL(text);
  return /^\/boards\/[0-9a-z]{13}$/.test(pathname) ? pathname : null;
}
