const isScreen = Boolean(process.stdout.isTTY) && !process.env.CI
const barWidth = 24

/**
 * Shows one long step. On a terminal its line is rewritten in place; in a log the step is one line when it begins and
 * one when it ends.
 * @param {string} title
 */
export function showStep(title) {
  const began = Date.now()
  let shown = ''
  if (isScreen) process.stdout.write(`  ${title} …`)
  else console.log(`  ${title} …`)
  return {
    /**
     * What is being done now; `share` from 0 to 1 when it is known.
     * @param {string} doing
     * @param {number} [share]
     */
    tell(doing, share) {
      if (!isScreen) return
      const line = `  ${title} ${share === undefined ? '…' : toBar(share)} ${doing}`
      if (line === shown) return
      shown = line
      process.stdout.write(`\r\x1b[2K${line.slice(0, (process.stdout.columns ?? 100) - 1)}`)
    },
    /** @param {string} [note] */
    done(note = '') {
      const line = `  ${title}: ${note === '' ? 'done' : note}, ${formatSeconds(Date.now() - began)}`
      process.stdout.write(isScreen ? `\r\x1b[2K${line}\n` : `${line}\n`)
    },
    failed() {
      process.stdout.write(isScreen ? `\r\x1b[2K  ${title}: failed\n` : `  ${title}: failed\n`)
    },
  }
}

/**
 * Shows a step while `work` runs and gives its result.
 * @template T
 * @param {string} title
 * @param {(tell: (doing: string, share?: number) => void) => T | Promise<T>} work
 * @returns {Promise<T>}
 */
export async function inStep(title, work) {
  const step = showStep(title)
  try {
    const result = await work(step.tell)
    step.done()
    return result
  } catch (error) {
    step.failed()
    throw error
  }
}

/** @param {number} share */
function toBar(share) {
  const full = Math.round(Math.min(1, Math.max(0, share)) * barWidth)
  return `[${'#'.repeat(full)}${'.'.repeat(barWidth - full)}]`
}

/** @param {number} milliseconds */
export function formatSeconds(milliseconds) {
  return `${(milliseconds / 1000).toFixed(1)} s`
}
