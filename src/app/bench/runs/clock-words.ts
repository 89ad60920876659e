/** Minutes and seconds, as a clock that counts down shows them: 9:05. */
export function clockWords(ms: number): string {
  const seconds = Math.ceil(ms / 1000);
  return `${Math.floor(seconds / 60)}:${String(seconds % 60).padStart(2, '0')}`;
}
