import { Link } from 'react-router'
import { formatCode } from '~/lib/code'
import { Button } from '~/ui/button'
import { TextArea } from '~/ui/field'

interface Photo {
  storageKey: string
  public: boolean
}

/** What a coordinator can do with a report: take in, put on record, ask, decline; and which photos the public may see. */
export function ReportDecision(props: {
  undecided: boolean
  reason: string | null
  hazardCode: string | null
  photos: Photo[]
  typed: Record<string, string | string[]>
  errors: Record<string, string>
  busy: boolean
}) {
  const { typed, errors } = props
  return (
    <>
      <PhotoChoice photos={props.photos} undecided={props.undecided} />
      {!props.undecided && props.hazardCode && (
        <p className="mt-4">
          Taken in as hazard <Link to={`/hazards/${props.hazardCode}`}>{formatCode(props.hazardCode)}</Link>.
        </p>
      )}
      {props.reason && <p className="mt-4">{`“${props.reason}”`}</p>}
      {props.undecided && (
        <>
          <div className="mt-5 flex flex-wrap gap-3">
            <Button kind="action" name="decision" value="take_in" pending={props.busy}>
              Take in
            </Button>
            <Button kind="quiet" name="decision" value="on_record" pending={props.busy}>
              Put on record, nothing to mend
            </Button>
          </div>
          <details className="mt-5 border-t border-rule pt-3" open={Boolean(errors.question)}>
            <summary className="cursor-pointer font-medium">Ask for detail</summary>
            <TextArea
              label="Your question"
              name="question"
              rows={3}
              defaultValue={String(typed.question ?? '')}
              error={errors.question}
            />
            <p className="mt-3">
              <Button kind="quiet" name="decision" value="ask" pending={props.busy}>
                Send question
              </Button>
            </p>
          </details>
          <details className="mt-3 border-t border-rule pt-3" open={Boolean(errors.reason)}>
            <summary className="cursor-pointer font-medium">Decline</summary>
            <TextArea
              label="Reason, for the reporter"
              name="reason"
              rows={3}
              defaultValue={String(typed.reason ?? '')}
              error={errors.reason}
            />
            <p className="mt-3">
              <Button kind="quiet" name="decision" value="decline" pending={props.busy}>
                Decline report
              </Button>
            </p>
          </details>
        </>
      )}
    </>
  )
}

function PhotoChoice({ photos, undecided }: { photos: Photo[]; undecided: boolean }) {
  if (photos.length === 0) return null
  return (
    <fieldset className="mt-3">
      <legend className="text-s text-stone">
        {undecided ? 'Photos. Tick those the public may see; look for faces first.' : 'Photos'}
      </legend>
      <ul className="mt-2 flex flex-wrap gap-3">
        {photos.map((photo, index) => (
          <li key={photo.storageKey}>
            <a href={`/photos/${photo.storageKey}/2048.webp`}>
              <img
                src={`/photos/${photo.storageKey}/960.webp`}
                alt={`Sent with the report, ${index + 1}`}
                width={240}
                height={180}
                className="h-45 w-60 rounded-[3px] border border-rule object-cover"
              />
            </a>
            {undecided && (
              <label className="mt-1 flex items-center gap-2 text-s">
                <input type="checkbox" name="photo" value={photo.storageKey} /> public
              </label>
            )}
          </li>
        ))}
      </ul>
    </fieldset>
  )
}
