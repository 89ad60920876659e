/** The value of a cookie in a request's Cookie header (RFC 6265, 4.2). */
export const readCookie = (header: string | undefined, name: string): string | undefined =>
  header
    ?.split(';')
    .map((pair) => pair.trim())
    .find((pair) => pair.startsWith(`${name}=`))
    ?.slice(name.length + 1);
