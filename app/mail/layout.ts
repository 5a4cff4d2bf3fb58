import { caution } from '~/lib/caution'
import { escapeHtml } from '~/web/plain-page'

/** What a mail says; every room fills this in and the mail room draws it. */
export interface MailContent {
  heading: string
  paragraphs: string[]
  /** a code or number to be read and typed, shown large */
  figure?: string
  button?: { words: string; url: string }
  /** facts as rows of a word and its value */
  table?: { rows: [string, string][] }
  /** a picture sent along under its content id */
  picture?: { contentId: string; alt: string }
  /** why this mail came, and how to have no more of them */
  footer?: string[]
}

const ink = {
  chalk: '#f6f3ec',
  sheet: '#fdfbf6',
  slate: '#1f2a30',
  stone: '#56636a',
  rule: '#d8d2c4',
  verdigris: '#17665a',
}
const font = "font-family:'Work Sans',system-ui,-apple-system,'Segoe UI',Roboto,Helvetica,Arial,sans-serif"

/** A mail's two parts, saying the same: HTML in the house's face, and plain text. Everything given is escaped. */
export function renderMail(content: MailContent): { text: string; html: string } {
  return { text: toText(content), html: toHtml(content) }
}

function toText({ heading, paragraphs, figure, button, table, picture, footer = [] }: MailContent): string {
  const rows = table?.rows.map(([word, value]) => `${word}: ${value}`).join('\n')
  const blocks = [
    heading,
    figure && `    ${figure}`,
    ...paragraphs,
    rows,
    picture && `[Picture: ${picture.alt}]`,
    button && `${button.words}:\n${button.url}`,
    'Cragfettle',
    ...footer,
    caution,
  ]
  return `${blocks.filter(Boolean).join('\n\n')}\n`
}

const lines = (text: string) => escapeHtml(text).replaceAll('\n', '<br>')
const paragraph = (text: string, style = '') => `<p style="margin:0 0 16px;${style}">${lines(text)}</p>`
const small = `font-size:13px;line-height:19px;color:${ink.stone}`

function toRow([word, value]: [string, string]): string {
  const cell = `padding:6px 0;border-top:1px solid ${ink.rule};vertical-align:top;text-align:left`
  return `<tr><th scope="row" style="${cell};padding-right:16px;font-weight:400;color:${ink.stone}">${lines(word)}</th><td style="${cell};font-variant-numeric:tabular-nums">${lines(value)}</td></tr>`
}

function toButton({ words, url }: { words: string; url: string }): string {
  const address = /^https?:\/\//.test(url) ? url : ''
  const style = `display:inline-block;padding:12px 20px;background:${ink.verdigris};color:#ffffff;text-decoration:none;font-weight:600;border-radius:3px`
  return `<p style="margin:24px 0"><a href="${escapeHtml(address)}" style="${style}">${lines(words)}</a></p>`
}

function toHtml({ heading, paragraphs, figure, button, table, picture, footer = [] }: MailContent): string {
  const parts = [
    `<h1 style="margin:0 0 16px;font-size:22px;line-height:28px;font-weight:600">${lines(heading)}</h1>`,
    figure &&
      paragraph(figure, 'font-size:32px;line-height:40px;font-weight:600;font-variant-numeric:tabular-nums'),
    ...paragraphs.map(text => paragraph(text)),
    table &&
      `<table role="presentation" style="width:100%;border-collapse:collapse;margin:0 0 16px">${table.rows.map(toRow).join('')}</table>`,
    picture &&
      `<p style="margin:0 0 16px"><img src="cid:${escapeHtml(picture.contentId)}" alt="${escapeHtml(picture.alt)}" style="max-width:100%;height:auto"></p>`,
    button && toButton(button),
  ]
  const feet = [...footer, caution].map(text => paragraph(text, small))
  return `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>${escapeHtml(heading)}</title></head>
<body style="margin:0;padding:24px 12px;background:${ink.chalk};color:${ink.slate};${font};font-size:16px;line-height:24px">
<div style="max-width:560px;margin:0 auto;padding:24px;background:${ink.sheet};border-top:3px solid ${ink.slate}">
${parts.filter(Boolean).join('\n')}
<div style="margin-top:32px;padding-top:16px;border-top:1px solid ${ink.rule}">
<p style="margin:0 0 16px;font-weight:600">Cragfettle</p>
${feet.join('\n')}
</div></div></body></html>
`
}
