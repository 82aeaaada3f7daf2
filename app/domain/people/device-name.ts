const systems: [RegExp, string][] = [
  [/iPhone/, "iPhone"],
  [/iPad/, "iPad"],
  [/Android/, "Android phone"],
  [/Windows/, "Windows"],
  [/Mac OS X/, "Mac"],
  [/Linux/, "Linux"],
];

const browsers: [RegExp, string][] = [
  [/Edg\//, "Edge"],
  [/Firefox\//, "Firefox"],
  [/Chrome\//, "Chrome"],
  [/Safari\//, "Safari"],
];

/** A device in words, from what its browser says of itself: "Firefox on Linux". Only for telling one's own sessions apart. */
export function deviceName(userAgent: string): string {
  const system = systems.find(([pattern]) => pattern.test(userAgent))?.[1];
  const browser = browsers.find(([pattern]) => pattern.test(userAgent))?.[1];
  if (browser && system) return `${browser} on ${system}`;
  return browser ?? system ?? "A device that does not say";
}
