const isScreen = Boolean(process.stdout.isTTY) && !process.env.CI
const barWidth = 24
/** how often a log hears that a step still goes on */
const logEvery = 30_000

/**
 * Shows one long step. On a terminal its line is rewritten in place, with the seconds so far; a log gets a line when the
 * step begins, one every half minute, and one when it ends.
 * @param {string} title
 */
export function showStep(title) {
  const began = Date.now()
  let now = { doing: '', share: /** @type {number | undefined} */ (undefined) }
  const draw = () => {
    const bar = now.share === undefined ? '…' : toBar(now.share)
    const line = `  ${title} ${bar} ${formatWhole(Date.now() - began)}  ${now.doing}`
    process.stdout.write(`\r\x1b[2K${line.slice(0, (process.stdout.columns || 100) - 1)}`)
  }
  const tick = setInterval(
    () => (isScreen ? draw() : console.log(`  ${title}: ${formatWhole(Date.now() - began)} … ${now.doing}`)),
    isScreen ? 1_000 : logEvery,
  )
  tick.unref()
  if (isScreen) draw()
  else console.log(`  ${title} …`)
  return {
    /**
     * What is being done now; `share` from 0 to 1 when it is known.
     * @param {string} doing
     * @param {number} [share]
     */
    tell(doing, share) {
      now = { doing, share }
      if (isScreen) draw()
    },
    /** A line that stays, above the step's own. @param {string} line */
    say(line) {
      process.stdout.write(isScreen ? `\r\x1b[2K${line}\n` : `${line}\n`)
      if (isScreen) draw()
    },
    /** @param {string} [note] */
    done(note = '') {
      clearInterval(tick)
      const line = `  ${title}: ${note === '' ? 'done' : note}, ${formatSeconds(Date.now() - began)}`
      process.stdout.write(isScreen ? `\r\x1b[2K${line}\n` : `${line}\n`)
    },
    failed() {
      clearInterval(tick)
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
function formatWhole(milliseconds) {
  return `${Math.floor(milliseconds / 1000)} s`
}

/** @param {number} milliseconds */
export function formatSeconds(milliseconds) {
  return `${(milliseconds / 1000).toFixed(1)} s`
}
