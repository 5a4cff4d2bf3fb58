import { Form } from 'react-router'
import { Button, ButtonLink } from '~/ui/button'
import { Select, TextArea } from '~/ui/field'
import { FormErrors } from '~/ui/form-errors'

interface Props {
  code: string
  /** what the table of moves and the viewer's roles allow */
  may: { offer: boolean; record: boolean; check: boolean; close: boolean; cancel: boolean }
  rebolters: { id: string; name: string }[]
  photos: { storageKey: string; public: boolean }[]
  errors: Record<string, string>
  typed: Record<string, string | string[]>
  busy: boolean
}

/** What can be done with an order next, and only that. */
export function OrderMoves(props: Props) {
  const { code, may, errors, typed, busy } = props
  return (
    <section aria-label="What is next" className="mt-5">
      <FormErrors errors={errors} />
      {may.offer && <OfferForm {...props} />}
      {may.record && (
        <>
          <ButtonLink to={`/orders/${code}/record`}>Record work</ButtonLink>
          <Form method="post" noValidate className="mt-5">
            <details className="border-t border-rule pt-3" open={Boolean(errors.words)}>
              <summary className="cursor-pointer font-medium">Hand the job back</summary>
              <TextArea
                label="Why"
                name="words"
                rows={2}
                defaultValue={String(typed.words ?? '')}
                error={errors.words}
              />
              <p className="mt-3">
                <Button kind="quiet" name="do" value="hand_back" pending={busy}>
                  Hand back
                </Button>
              </p>
            </details>
          </Form>
        </>
      )}
      {may.check && <ButtonLink to={`/orders/${code}/check`}>Check the work</ButtonLink>}
      {may.close && <CloseForm {...props} />}
      {may.cancel && (
        <Form method="post" noValidate className="mt-5">
          <Button kind="danger" name="do" value="cancel" pending={busy}>
            Cancel order
          </Button>
        </Form>
      )}
    </section>
  )
}

function OfferForm({ rebolters, errors, typed, busy }: Props) {
  if (rebolters.length === 0)
    return <p className="text-stone">Your organisation has no rebolter on record to offer the job to.</p>
  return (
    <Form method="post" noValidate className="grid max-w-[26rem] gap-4">
      <Select
        label="Offer the job to"
        name="personId"
        defaultValue={String(typed.personId ?? '')}
        options={[
          { value: '', label: 'choose' },
          ...rebolters.map(({ id, name }) => ({ value: id, label: name })),
        ]}
        error={errors.personId}
      />
      <p>
        <Button kind="action" name="do" value="offer" pending={busy}>
          Offer by mail
        </Button>
      </p>
    </Form>
  )
}

function CloseForm({ photos, busy }: Props) {
  return (
    <Form method="post" noValidate>
      {photos.length > 0 && (
        <fieldset className="mb-4">
          <legend className="text-s text-stone">
            Photos of the work. Ticked ones are public, and the first goes with the thanks to who reported.
            Look for faces.
          </legend>
          <ul className="mt-2 flex flex-wrap gap-3">
            {photos.map((photo, index) => (
              <li key={photo.storageKey}>
                <img
                  src={`/photos/${photo.storageKey}/320.webp`}
                  alt={`The work, ${index + 1}`}
                  width={160}
                  height={120}
                  className="h-30 w-40 rounded-[3px] border border-rule object-cover"
                />
                <label className="mt-1 flex items-center gap-2 text-s">
                  <input type="checkbox" name="photo" value={photo.storageKey} defaultChecked /> public
                </label>
              </li>
            ))}
          </ul>
        </fieldset>
      )}
      <p className="mb-3 max-w-[52ch] text-s text-stone">
        Closing clears the hazard, renews the parts on record, ends its first warning, and thanks who reported
        it.
      </p>
      <Button kind="action" name="do" value="close" pending={busy}>
        Close order
      </Button>
    </Form>
  )
}
