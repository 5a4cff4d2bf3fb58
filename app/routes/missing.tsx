import { notFound } from '~/web/responses'

/** Any address that nothing else answers. */
export function loader(): never {
  throw notFound()
}

export const action = loader

export default function Missing() {
  return null
}
