/** What is wrong with a tile's address, in a sentence, or null: zoom 0 to 22, column and row below two to the zoom. */
export function findTileFault(z: number, x: number, y: number): string | null {
  if (![z, x, y].every(Number.isInteger))
    return 'A tile is named by three whole numbers: zoom, column and row, as in /ground/12/1722/1644.mvt.'
  if (z > 22) return `Zoom ${z} is too large: the largest is 22.`
  const most = 2 ** z - 1
  if (x > most || y > most)
    return `At zoom ${z} columns and rows go from 0 to ${most}; asked were ${x} and ${y}.`
  return null
}
