import { useId } from 'react'
import { photoLimits } from '../photo'

/**
 * Photos of a form: those already taken up stay through every error and can be left out again; more can be added. Each
 * one refused has its sentence. Works without JavaScript.
 */
export function PhotoField(props: {
  staged: { key: string }[]
  refused: string[]
  error?: string
  hint?: string
}) {
  const id = useId()
  const left = photoLimits.files - props.staged.length
  return (
    <fieldset className="mt-6" aria-describedby={`${id}-hint`}>
      <legend className="text-1 font-semibold">Photos</legend>
      <p id={`${id}-hint`} className="mt-1 text-s text-stone">
        {props.hint ??
          `Up to ${photoLimits.files}. Close up, with something for scale. The place the camera wrote is left out.`}
      </p>
      {(props.refused.length > 0 || props.error) && (
        <ul className="mt-2 text-oxide" role="alert">
          {props.error && <li>{props.error}</li>}
          {props.refused.map(sentence => (
            <li key={sentence}>{sentence}</li>
          ))}
        </ul>
      )}
      <div className="mt-3 flex flex-wrap gap-2.5">
        {props.staged.map((photo, index) => (
          <label key={photo.key} className="photo-kept">
            <img
              src={`/photos/${photo.key}/320.webp`}
              alt={`Taken up, ${index + 1}`}
              width={92}
              height={92}
              className="size-23 rounded-[3px] object-cover"
            />
            <span className="text-s">
              <input type="checkbox" name="photo" value={photo.key} defaultChecked /> send it
            </span>
          </label>
        ))}
        {left > 0 && (
          <label className="photo-add" htmlFor={`${id}-files`}>
            <span>Add photo</span>
            <input id={`${id}-files`} type="file" name="photos" accept="image/*" multiple />
          </label>
        )}
      </div>
    </fieldset>
  )
}
