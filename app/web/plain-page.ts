const escapes: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
}

/** Text that stands in HTML as it was typed, in an attribute too. */
export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, character => escapes[character]!)
}

/** A whole small page for answers given before the application's own pages can be drawn. */
export function toPlainPage(heading: string, paragraphs: string[]): string {
  const body = paragraphs.map(text => `<p>${escapeHtml(text)}</p>`).join('\n')
  return `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escapeHtml(heading)} · Cragfettle</title></head>
<body><main>
<h1>${escapeHtml(heading)}</h1>
${body}
</main></body>
</html>
`
}
