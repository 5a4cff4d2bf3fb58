import { createContext } from 'react-router'

export interface StagedPhoto {
  key: string
  width: number
  height: number
}

/** A form with photos as multer left it: its fields, the photos taken up now, and those refused with a sentence. */
export interface Uploads {
  formData: FormData
  staged: StagedPhoto[]
  refused: string[]
}

export const uploadsContext = createContext<Uploads | null>(null)
