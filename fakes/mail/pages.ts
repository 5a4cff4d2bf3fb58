import type { Letter } from './letter'

const escaped: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
}
const escapeHtml = (text: string) => text.replace(/[&<>"']/g, sign => escaped[sign]!)

const style = `
  :root { color-scheme: light dark; font: 16px/1.5 system-ui, sans-serif }
  body { max-width: 60rem; margin: 2rem auto; padding: 0 1rem }
  table { width: 100%; border-collapse: collapse }
  th, td { text-align: left; vertical-align: top; padding: .6rem .8rem .6rem 0; border-bottom: 1px solid #8886 }
  iframe { width: 100%; height: 32rem; border: 1px solid #8886; background: #fff }
  pre { white-space: pre-wrap; overflow-wrap: anywhere }
  dt { font-weight: 600 } dd { margin: 0 0 .4rem; overflow-wrap: anywhere }
  img { max-width: 100%; max-height: 20rem }
`

const page = (title: string, body: string) => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<link rel="icon" href="data:,"><title>${escapeHtml(title)}</title><style>${style}</style></head>
<body>${body}</body></html>`

const clock = (at: Date) => at.toLocaleString('en-GB', { dateStyle: 'medium', timeStyle: 'medium' })

/** The list of all mails taken in, the newest on top. */
export function toInboxPage(letters: Letter[]): string {
  const rows = [...letters].reverse().map(
    letter => `<tr><td><a href="/messages/${letter.id}">${escapeHtml(letter.subject || '(no subject)')}</a></td>
<td>${escapeHtml(letter.to.join(', '))}</td><td>${clock(letter.at)}</td></tr>`,
  )
  const list =
    rows.length === 0
      ? '<p>No mail yet. Ask for a sign-in code or send a report, then load this page again.</p>'
      : `<table><thead><tr><th>Subject</th><th>To</th><th>Came in</th></tr></thead><tbody>${rows.join('\n')}</tbody></table>`
  return page(
    'Inbox',
    `<h1>Inbox</h1><p>Every mail this installation sends ends here. Nothing leaves this machine.</p>${list}`,
  )
}

/** One mail: who, what, its html as a mail program would show it, its text, its files. */
export function toLetterPage(letter: Letter): string {
  const files = letter.parts.map((part, index) => {
    const path = `/messages/${letter.id}/parts/${index}`
    const shown = part.type.startsWith('image/')
      ? `<br><img src="${path}" alt="${escapeHtml(part.name)}">`
      : ''
    return `<li><a href="${path}">${escapeHtml(part.name)}</a> (${escapeHtml(part.type)}, ${part.bytes.length} bytes)${shown}</li>`
  })
  const html =
    letter.html === ''
      ? ''
      : `<iframe title="The mail as it is read" sandbox="allow-popups allow-popups-to-escape-sandbox" src="/messages/${letter.id}/html"></iframe>`
  return page(
    letter.subject,
    `<p><a href="/">Inbox</a></p><h1>${escapeHtml(letter.subject || '(no subject)')}</h1>
<dl><dt>From</dt><dd>${escapeHtml(letter.from)}</dd><dt>To</dt><dd>${escapeHtml(letter.to.join(', '))}</dd>
<dt>Came in</dt><dd>${clock(letter.at)}</dd></dl>
${html}<h2>Text</h2><pre>${linked(letter.text)}</pre>
${files.length === 0 ? '' : `<h2>Files</h2><ul>${files.join('')}</ul>`}`,
  )
}

const linked = (text: string) =>
  text
    .split(/(https?:\/\/[^\s<>"']+)/)
    .map((piece, index) =>
      index % 2 === 1
        ? `<a target="_blank" href="${escapeHtml(piece)}">${escapeHtml(piece)}</a>`
        : escapeHtml(piece),
    )
    .join('')

/** What a `cid:` address can mean: as it stands, and with its percent signs undone where they are well formed. */
function toContentIds(id: string): string[] {
  try {
    return [id, decodeURIComponent(id)]
  } catch {
    return [id]
  }
}

/** The html of a mail for its frame: links open in a new tab, pictures of the mail come from its own parts. */
export function toFramePage(letter: Letter): string {
  const html = letter.html.replace(/cid:([^"'\s)>]+)/gi, (whole, id: string) => {
    const index = letter.parts.findIndex(
      part => part.contentId !== null && toContentIds(id).includes(part.contentId),
    )
    return index === -1 ? whole : `/messages/${letter.id}/parts/${index}`
  })
  const base = '<base target="_blank">'
  return /<head[^>]*>/i.test(html) ? html.replace(/<head[^>]*>/i, head => `${head}${base}`) : `${base}${html}`
}
