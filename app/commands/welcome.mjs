/**
 * What a person reads when all is up: where the pages are, where the mails go, and as whom to sign in.
 * @param {{ url: string, inboxUrl: string | null, accounts: { name: string, email: string, does: string }[] }} shown
 * @returns {string}
 */
export function toWelcome({ url, inboxUrl, accounts }) {
  const lines = ['', `Cragfettle is at  ${url}`]
  if (inboxUrl !== null) lines.push(`Its mails are at  ${inboxUrl}  (every mail it sends ends there)`)
  if (accounts.length > 0) {
    const width = Math.max(...accounts.map(({ email }) => email.length))
    const names = Math.max(...accounts.map(({ name }) => name.length))
    lines.push('', 'Demo accounts: sign in with the address, the code comes by mail.')
    for (const { name, email, does } of accounts)
      lines.push(`  ${email.padEnd(width)}  ${name.padEnd(names)}  ${does}`)
  }
  return [...lines, '', 'Ctrl-C ends it.'].join('\n')
}
