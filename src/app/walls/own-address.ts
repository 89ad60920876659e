/** Whether an address leads nowhere from another machine: this one's own names for itself (RFC 6761, 6.3; RFC 1122, 3.2.1.3). */
export function isOwnAddress(origin: string): boolean {
  const { hostname } = new URL(origin);
  return hostname === 'localhost' || hostname.endsWith('.localhost') || /^127\./.test(hostname) || hostname === '[::1]';
}

/** What is to be said of an address at which another machine is to open Oriel; empty where it will do. */
export function addressWarnings(origin: string): string[] {
  if (isOwnAddress(origin))
    return [
      `${new URL(origin).host} works on this computer only. That will do if the wall’s screen hangs on this very computer.`,
      'For a screen with a computer of its own, start the server so that others reach it: HTTPS=self HOST=0.0.0.0 PUBLIC_URL=https://NAME:PORT, NAME being this computer’s name or address in your network; or put it behind a proxy with https and set PUBLIC_URL to that. Then open this page at that address: it prints the right one by itself.',
    ];
  if (!origin.startsWith('https:'))
    return ['Browsers give the camera only to https, and this address is plain http: the wall will show its picture and not follow. Start the server with HTTPS=self, or put it behind a proxy with https.'];
  return [];
}
