/**
 * The clock commands are given. With `clockAt` (an ISO moment; demo and tests only) it starts there when the process
 * starts and goes on at the usual pace.
 */
export function toClock(clockAt: string | null): () => Date {
  if (clockAt === null) return () => new Date()
  const ahead = Date.parse(clockAt) - Date.now()
  return () => new Date(Date.now() + ahead)
}
