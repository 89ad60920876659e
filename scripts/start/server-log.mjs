import { lastLines } from '../command.mjs';

/**
 * Why the server ended, from its log: the last thing it called fatal or an error, in its own words, else its last lines.
 * @param {string} text lines of JSON by pino, among which anything Node printed
 */
export function whatWentWrong(text) {
  const lines = text.trimEnd().split('\n');
  const failure = lines.map(asEntry).findLast((entry) => entry?.level >= 50);
  if (failure) return [failure.msg, failure.err?.message].filter(Boolean).join(': ');
  // Node prints an error nobody caught as `Error: message`, over several lines, and then the stack.
  const thrown = /^(?:\w*Error): ([\s\S]*?)\n\s+at /m.exec(text);
  return thrown?.[1] ?? `The server ended. The end of its log:\n${lastLines(text, 12)}`;
}

function asEntry(line) {
  try {
    return JSON.parse(line);
  } catch {
    return null;
  }
}
