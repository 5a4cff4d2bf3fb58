import { formatMoment } from '~/ui/when'
import type { OfferState } from '../order'
import { offerStateWords } from '../words'

interface Offer {
  id: string
  name: string
  state: OfferState
  expiresAt: Date
  words: string | null
}

/** To whom an order was offered, and what they answered. */
export function OfferList({ offers, timeZone }: { offers: Offer[]; timeZone: string }) {
  if (offers.length === 0) return null
  return (
    <>
      <h2 className="mt-8 text-1 font-semibold">Offers</h2>
      <ul className="mt-2 border-t border-slate">
        {offers.map(offer => (
          <li key={offer.id} className="border-b border-rule py-2">
            {`${offer.name}: ${offerStateWords[offer.state]}`}
            {offer.state === 'sent' && (
              <span className="text-stone">{`, until ${formatMoment(offer.expiresAt, timeZone)}`}</span>
            )}
            {offer.words && <div className="text-stone">{`“${offer.words}”`}</div>}
          </li>
        ))}
      </ul>
    </>
  )
}
