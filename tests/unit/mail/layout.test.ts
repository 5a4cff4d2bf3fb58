import { expect, test } from 'vitest'
import { caution } from '~/lib/caution'
import { renderMail } from '~/mail/layout'

const content = {
  heading: 'A job for <you>',
  paragraphs: ['Bolt 3 of "Slack Water" & friends', 'Two\nlines'],
  figure: '4821 9306',
  button: { words: 'Look at the job', url: 'https://gear.example.org/offers/x?a=1&b=2' },
  table: { rows: [['Crag', '<b>Keld</b>']] as [string, string][] },
  picture: { contentId: 'photo1', alt: 'The ring, worn to half' },
  footer: ['You get this because you offered to help.'],
}

test('both parts of a mail say the same', () => {
  const { text, html } = renderMail(content)
  const read = html
    .replace(/<style.*?<\/style>/gs, '')
    .replace(/&lt;/g, '<')
    .replace(/&gt;/g, '>')
    .replace(/&quot;/g, '"')
    .replace(/&amp;/g, '&')
  const said = [
    content.heading,
    content.figure,
    content.paragraphs[0]!,
    content.button.words,
    content.button.url,
  ]
  for (const words of [...said, 'Crag', '<b>Keld</b>', content.picture.alt, content.footer[0]!, caution]) {
    expect(text).toContain(words)
    expect(read).toContain(words)
  }
})

test('what people wrote cannot become markup', () => {
  const { html } = renderMail(content)
  expect(html).toContain('&lt;b&gt;Keld&lt;/b&gt;')
  expect(html).not.toContain('<you>')
  expect(html).toContain('Two<br>lines')
})

test('a button leads to a web address or nowhere', () => {
  const { html } = renderMail({ ...content, button: { words: 'x', url: 'javascript:alert(1)' } })
  expect(html).toContain('href=""')
})

test('every mail ends with the caution', () => {
  const { text } = renderMail({ heading: 'x', paragraphs: [] })
  expect(text.trim().endsWith(caution)).toBe(true)
})
