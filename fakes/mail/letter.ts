import PostalMime, { type Attachment } from 'postal-mime'

/** One part of a letter that is a file: an attachment, or a picture shown inside the text. */
export interface Part {
  name: string
  type: string
  contentId: string | null
  bytes: Buffer
}

/** One mail as it was handed over. `to` are the addresses of the envelope; `links` stand in order, each once. */
export interface Letter {
  id: number
  from: string
  to: string[]
  subject: string
  text: string
  html: string
  links: string[]
  headers: Record<string, string>
  at: Date
  parts: Part[]
}

/** Reads a raw mail (RFC 5322) into a letter; encodings of the text and of the headers are undone. */
export async function toLetter(raw: Buffer, given: { id: number; to: string[]; at: Date }): Promise<Letter> {
  const mail = await PostalMime.parse(raw)
  const text = mail.text ?? ''
  const html = mail.html ?? ''
  return {
    ...given,
    from: mail.from?.name ? `${mail.from.name} <${mail.from.address}>` : (mail.from?.address ?? ''),
    subject: mail.subject ?? '',
    text,
    html,
    links: listLinks(text, html),
    headers: Object.fromEntries(mail.headers.map(({ key, value }) => [key, value])),
    parts: mail.attachments.map(toPart),
  }
}

function toPart(file: Attachment, index: number): Part {
  const { content } = file
  return {
    name: file.filename ?? `part-${index + 1}`,
    type: file.mimeType,
    contentId: file.contentId?.replace(/^<|>$/g, '') ?? null,
    bytes: typeof content === 'string' ? Buffer.from(content) : Buffer.from(new Uint8Array(content)),
  }
}

/** The web addresses of a mail: first those of its text, then those only its html links to; each once. */
export function listLinks(text: string, html: string): string[] {
  const inText = [...text.matchAll(/https?:\/\/[^\s<>"']+/g)].map(([url]) => url.replace(/[.,;:!?)\]]+$/, ''))
  const inHtml = [...html.matchAll(/href\s*=\s*["'](https?:\/\/[^"']+)["']/gi)].map(match =>
    match[1]!.replaceAll('&amp;', '&'),
  )
  return [...new Set([...inText, ...inHtml])]
}
