const away = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'EPIPE',
  'ETIMEDOUT',
  'EHOSTUNREACH',
  'ENETUNREACH',
  'ENOTFOUND',
  'EAI_AGAIN',
  'PROTOCOL_CONNECTION_LOST',
  'PROTOCOL_ENQUEUE_AFTER_FATAL_ERROR',
  'PROTOCOL_ENQUEUE_AFTER_QUIT',
  // too many connections; server shutdown in progress; killed; read-only while it starts or stops
  'ER_CON_COUNT_ERROR',
  'ER_SERVER_SHUTDOWN',
  'ER_NORMAL_SHUTDOWN',
  'ER_CONNECTION_KILLED',
])
const awayNumbers = new Set([1040, 1053, 1077, 1927])

function isAwayItself(error: Error): boolean {
  const { code, errno } = error as { code?: unknown; errno?: unknown }
  if (typeof code === 'string' && away.has(code)) return true
  if (typeof errno === 'number' && awayNumbers.has(errno)) return true
  return /connection is in closed state|Connection lost|Pool is closed/i.test(error.message)
}

/** Whether an error, or what caused it, means that the database cannot be reached now, so that trying later may help. */
export function isDatabaseAway(error: unknown): boolean {
  for (let at = error; at instanceof Error; at = at.cause) {
    if (isAwayItself(at)) return true
  }
  return false
}
