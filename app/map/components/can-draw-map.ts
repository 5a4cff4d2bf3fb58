/** Whether this browser can draw the map at all (WebGL 2); false on the server. */
export function canDrawMap(): boolean {
  if (typeof document === 'undefined') return false
  try {
    const context = document.createElement('canvas').getContext('webgl2')
    context?.getExtension('WEBGL_lose_context')?.loseContext()
    return context !== null
  } catch {
    return false
  }
}
