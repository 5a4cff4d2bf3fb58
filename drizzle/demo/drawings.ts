import { randomBytes } from 'node:crypto'
import { join } from 'node:path'
import sharp from 'sharp'
import { type TakenPhoto, takePhotoFile } from '../../app/reports/photo-files.server'

export type Drawing = 'groove' | 'rust' | 'eye' | 'ring' | 'new-ring'

const rock = (tint: string) => `
  <defs>
    <filter id="grain" x="0" y="0" width="100%" height="100%"><feTurbulence type="fractalNoise" baseFrequency="0.035" numOctaves="4" seed="7"/><feColorMatrix values="0 0 0 0 0.35  0 0 0 0 0.33  0 0 0 0 0.3  0 0 0 0.55 0"/></filter>
    <linearGradient id="steel" x1="0" x2="1"><stop offset="0" stop-color="#d9dcdb"/><stop offset=".5" stop-color="#8b9292"/><stop offset="1" stop-color="#5c6466"/></linearGradient>
  </defs>
  <rect width="1200" height="900" fill="${tint}"/><rect width="1200" height="900" filter="url(#grain)"/>`

const ring = (bite: string) => `
  <path d="M600 120v130" stroke="url(#steel)" stroke-width="46" stroke-linecap="round"/>
  <circle cx="600" cy="470" r="215" fill="none" stroke="url(#steel)" stroke-width="58"/>
  ${bite}`

const scenes: Record<Drawing, string> = {
  ring: `${rock('#9a9486')}${ring('<path d="M530 655a80 62 0 0 1 150-4l14 46a215 215 0 0 1-178 6z" fill="#3c4042"/><path d="M522 668l16-30m146 26l-18-28" stroke="#eef0ee" stroke-width="5"/>')}`,
  'new-ring': `${rock('#9a9486')}${ring('')}`,
  groove: `${rock('#8f8a7c')}
    <path d="M470 180c-90 40-120 150-90 250l70 240c20 70 90 90 150 80s120-50 120-130l-10-300c-5-110-130-190-240-140z" fill="none" stroke="url(#steel)" stroke-width="50"/>
    <path d="M560 748a46 38 0 0 1 90-14l8 40-98 4z" fill="#43484a"/>`,
  rust: `${rock('#a49a87')}
    ${[0, 1, 2, 3].map(i => `<ellipse cx="${430 + i * 120}" cy="${250 + i * 130}" rx="62" ry="104" transform="rotate(-40 ${430 + i * 120} ${250 + i * 130})" fill="none" stroke="url(#steel)" stroke-width="40"/>`).join('')}
    ${[0, 1, 2, 3, 4, 5, 6].map(i => `<circle cx="${390 + i * 74}" cy="${230 + i * 82}" r="${9 + (i % 3) * 6}" fill="#8a4a22" opacity=".85"/>`).join('')}`,
  eye: `${rock('#7c8084')}
    <ellipse cx="600" cy="450" rx="150" ry="185" fill="none" stroke="url(#steel)" stroke-width="52"/>
    <ellipse cx="600" cy="282" rx="64" ry="34" fill="#55595b"/><path d="M540 300q60 34 120 0" stroke="#c9c2b0" stroke-width="10" fill="none"/>`,
}

/** A drawn picture of gear, taken up like any photo. */
export async function drawPhoto(photoDir: string, drawing: Drawing): Promise<TakenPhoto> {
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="1200" height="900" viewBox="0 0 1200 900">${scenes[drawing]}</svg>`
  const path = join(photoDir, 'incoming', randomBytes(16).toString('hex'))
  await sharp(Buffer.from(svg)).jpeg({ quality: 92 }).toFile(path)
  return await takePhotoFile(photoDir, path)
}
