import { randomBytes } from 'node:crypto'
import { createWriteStream } from 'node:fs'
import { rm } from 'node:fs/promises'
import { join } from 'node:path'
import { Transform } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import type { StorageEngine } from 'multer'

/**
 * A multer storage in a folder that never fails a whole form for one large file: what goes past `maxBytes` is drained
 * unwritten, and the file comes back with a size above the cap, for the caller to refuse by itself.
 */
export function cappedDisk(folder: string, maxBytes: number): StorageEngine {
  return {
    _handleFile(_request, file, done) {
      const path = join(folder, randomBytes(16).toString('hex'))
      let size = 0
      const cap = new Transform({
        transform(chunk: Buffer, _encoding, pass) {
          size += chunk.length
          pass(null, size > maxBytes ? undefined : chunk)
        },
      })
      pipeline(file.stream, cap, createWriteStream(path)).then(
        () => done(null, { path, size }),
        error => rm(path, { force: true }).then(() => done(error), done),
      )
    },
    _removeFile(_request, file, done) {
      rm(file.path, { force: true }).then(() => done(null), done)
    },
  }
}
