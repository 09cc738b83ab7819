/** Asks again and again until the answer is there; tests wait for a state, never for a time. */
export async function eventually<T>(
  ask: () => Promise<T | null | undefined | false>,
  what: string,
  timeoutMs = 60_000,
): Promise<T> {
  const deadline = performance.now() + timeoutMs;
  for (;;) {
    const answer = await ask();
    if (answer) return answer;
    if (performance.now() > deadline) throw new Error(`Not within ${timeoutMs} ms: ${what}`);
    await new Promise((next) => setTimeout(next, 100));
  }
}
