/** In this header the web server tells the app who asks. It takes it off every request that arrives, so nobody can write it from outside. */
export const clientAddressHeader = "X-Client-Address";

/** The address a request came from, to count tries by; "unknown" where no web server of ours stands in front, as in development. */
export function clientAddress(request: Request): string {
  return request.headers.get(clientAddressHeader) ?? "unknown";
}
