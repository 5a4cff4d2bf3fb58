/** Where the last part of a path is the secret of a mailed link. */
const linkPaths = ['/status/', '/offers/', '/sheet/'] as const

/** Whether a path is a page behind a mailed link. */
export function isLinkPath(path: string): boolean {
  return linkPaths.some(start => path.startsWith(start))
}

/** A path for the log: what follows a link page's name is a secret and becomes `…`. */
export function redactPath(path: string): string {
  const start = linkPaths.find(start => path.startsWith(start))
  return start === undefined ? path : `${start}…`
}
