/**
 * The Message-ID all mails of a thread refer to, though no mail bears it, so that whichever comes first they hang
 * together in the reader's program. The thread's own signs are kept apart from the angle brackets around.
 */
export function toThreadId(thread: string): string {
  const plain = thread
    .toLowerCase()
    .replace(/[^a-z0-9-]+/g, '.')
    .replace(/^\.+|\.+$/g, '')
  return `<thread.${plain}@cragfettle>`
}
