/** The body was larger than is taken. */
export class BodyTooLarge extends Error {}

/**
 * Reads a body as UTF-8 text, giving up as soon as it passes `maxBytes`.
 * @throws BodyTooLarge, or what the stream throws when it breaks or is aborted
 */
export async function readBoundedText(response: Response, maxBytes: number, signal: AbortSignal): Promise<string> {
  if (!response.body) return '';
  const reader = response.body.getReader();
  const stop = (): void => void reader.cancel(signal.reason).catch(() => undefined);
  signal.addEventListener('abort', stop, { once: true });
  try {
    const decoder = new TextDecoder();
    let text = '';
    for (let bytes = 0; ; ) {
      const { done, value } = await reader.read();
      // A cancelled reader ends like a finished one: only the signal tells the two apart.
      signal.throwIfAborted();
      if (done) return text + decoder.decode();
      bytes += value.byteLength;
      if (bytes > maxBytes) {
        stop();
        throw new BodyTooLarge(`The body is larger than ${maxBytes} bytes.`);
      }
      text += decoder.decode(value, { stream: true });
    }
  } finally {
    signal.removeEventListener('abort', stop);
  }
}
